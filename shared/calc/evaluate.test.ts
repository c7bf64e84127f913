import { describe, expect, it } from 'vitest';
import { builtInTables } from './channel-plans.ts';
import { evaluate } from './evaluate.ts';
import { receiver } from './harbour-receiver.fixture.ts';
import { allDependsOn, compile } from './program.ts';
import { proof } from './proof.ts';
import { quantityDefinition } from './quantity.ts';
import { derived, input } from './sample-quantities.fixture.ts';

const program = compile(receiver, builtInTables);

describe('the harbour receiver', () => {
  it('has definitions that the schema accepts and a program without problems', () => {
    expect(receiver.map((each) => quantityDefinition.safeParse(each).success)).not.toContain(false);
    expect(program.problems).toEqual([]);
  });

  it('comes out as printed at home: its proof holds', () => {
    const { holds, items } = proof(program);
    expect(items.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(holds).toBe(true);
    expect(items.map(({ printed, computed }) => [printed, computed])).toEqual(
      items.map(({ printed }) => [printed, printed]),
    );
  });

  // Ship frequencies: ITU Radio Regulations, Appendix 18; the rest is arithmetic of the receiver.
  it.each([
    [6, '156.300 mc', '145.600 mc', '16.177778 mc', '134.900 mc'],
    [12, '156.600 mc', '145.900 mc', '16.211111 mc', '135.200 mc'],
    [16, '156.800 mc', '146.100 mc', '16.233333 mc', '135.400 mc'],
    [70, '156.525 mc', '145.825 mc', '16.202778 mc', '135.125 mc'],
    [28, '157.400 mc', '146.700 mc', '16.300000 mc', '136.000 mc'],
  ])('moves to channel %d', (channel, carrier, injection, crystal, image) => {
    const { values, setting } = evaluate(program, { channel });
    expect([
      values['carrier']?.text,
      values['injection']?.text,
      values['crystal']?.text,
      values['image']?.text,
    ]).toEqual([carrier, injection, crystal, image]);
    expect(setting).toEqual({ channel, first_if: 10.7 });
    expect(values['crystal']).toMatchObject({ printed: '16.211111 mc', dependsOn: ['injection', 'multiplier'] });
  });

  it('keeps (156.6 - 10.7) / 9 MHz to the last digits of a double', () => {
    const crystal = evaluate(program).values['crystal']?.value ?? NaN;
    // 145.9 / 9 = 16.2111..., a repeating decimal: arithmetic.
    expect(Math.abs(crystal - 16.2111111111111111)).toBeLessThan(4e-15);
    expect(evaluate(program).values['injection']?.value).toBe(145.9);
    expect(evaluate(program).values['image']?.value).toBe(135.2);
    expect(evaluate(program).values['second_injection']).toMatchObject({ value: 10.245, text: '10.245 MHz' });
  });

  it('keeps a millihertz at ten gigahertz', () => {
    const link = compile([
      input('uplink', { unit: 'GHz', home: '9.999999999999 GHz' }),
      derived('downlink', 'uplink + 0.002 Hz', { unit: 'Hz' }),
    ]);
    expect(Math.abs((evaluate(link).values['downlink']?.value ?? NaN) - 10_000_000_000.001)).toBeLessThan(1e-5);
  });

  it.each([
    ['16', '156.800 mc'],
    [' 16 ', '156.800 mc'],
    [16, '156.800 mc'],
  ])('takes %o as a channel', (channel, carrier) => {
    expect(evaluate(program, { channel }).values['carrier']?.text).toBe(carrier);
  });

  it('takes text with another unit, and text without one in its own', () => {
    expect(evaluate(program, { first_if: '10,695 kc' }).values['injection']?.value).toBe(145.905);
    expect(evaluate(program, { first_if: '10.695' }).values['injection']?.value).toBe(145.905);
  });

  it.each([
    [
      { channel: 29 },
      'carrier',
      'not-in-table',
      'Channel 29 is not in "VHF maritime mobile band", which has 1 to 28 and 60 to 88.',
    ],
    [{ channel: 12.5 }, 'channel', 'not-an-integer', 'channel must be a whole number, not 12.5.'],
    [{ channel: NaN }, 'channel', 'not-finite', 'channel must be a number.'],
    [{ channel: 'twelve' }, 'channel', 'not-a-quantity', '"twelve" does not begin with a number.'],
    [{ first_if: '10.7 v' }, 'first_if', 'unit-mismatch', 'first_if is a frequency, but "10.7 v" is a voltage.'],
    [{ first_if: '10 to 11 mc' }, 'first_if', 'not-a-quantity', '"10 to 11 mc" is a range. Give first_if one value.'],
    [
      { first_if: '' },
      'first_if',
      'not-a-quantity',
      'There is nothing to read. Write a number and its unit, like 455 kc.',
    ],
  ])('%o leaves %s without a value: %s', (inputs, symbol, code, message) => {
    const { values } = evaluate(program, inputs, {
      tolerances: true,
      sensitivities: true,
    });
    expect(values[symbol]).toMatchObject({ value: null, text: '', problem: { code, message } });
    expect(values['crystal']).toMatchObject({
      value: null,
      text: '',
      problem: { code: 'depends-on-unavailable', cause: symbol },
    });
    expect(values['crystal']?.problem?.message).toContain(message);
    expect(values['crystal']).not.toHaveProperty('low');
    expect(values['second_if']).toMatchObject({ value: 455 });
  });

  it('says so when something else than an input is set', () => {
    const { problems, values } = evaluate(program, { crystal: 16, multiplier: 8, nothing: 1 });
    expect(problems.map(({ code, symbol }) => [symbol, code])).toEqual([
      ['crystal', 'not-an-input'],
      ['multiplier', 'not-an-input'],
      ['nothing', 'unknown-symbol'],
    ]);
    expect(values['crystal']?.text).toBe('16.211111 mc');
  });

  it('names all that a quantity rests on', () => {
    expect(allDependsOn(program, 'crystal').sort()).toEqual([
      'carrier',
      'channel',
      'first_if',
      'injection',
      'multiplier',
    ]);
    expect(program.dependsOn.get('image')).toEqual(['carrier', 'first_if']);
    expect(program.order.indexOf('crystal')).toBeGreaterThan(program.order.indexOf('injection'));
  });
});
