import { describe, expect, it } from 'vitest';
import { builtInTables } from './channel-plans.ts';
import { evaluate } from './evaluate.ts';
import { receiver } from './harbour-receiver.fixture.ts';
import { compile } from './program.ts';
import { derived, input } from './sample-quantities.fixture.ts';

const program = compile(receiver, builtInTables);

describe('tolerances and sensitivities', () => {
  it('are left out unless asked for', () => {
    expect(Object.keys(evaluate(program).values['crystal'] ?? {}).sort()).toEqual([
      'dependsOn',
      'printed',
      'text',
      'unit',
      'value',
    ]);
  });

  it('carry the spread of the IF to the crystal', () => {
    const { values } = evaluate(program, {}, { tolerances: true, sensitivities: true });
    expect(values['first_if']).toMatchObject({ low: 10.695, high: 10.705 });
    expect(values['injection']).toMatchObject({ low: 145.895, high: 145.905 });
    expect(values['crystal']?.high).toBeCloseTo(145.905 / 9, 9);
    expect(values['image']).toMatchObject({ low: 135.19, high: 135.21 });
    expect(values['carrier']).not.toHaveProperty('low');
    // d fX / d fIF = -1 / M, chain arithmetic section 2 of the reference notes.
    expect(values['crystal']?.sensitivity?.['first_if']?.absolute).toBeCloseTo(-1 / 9, 12);
    expect(values['crystal']?.sensitivity?.['first_if']?.ppm).toBeCloseTo(-10.7 / 145.9, 12);
    expect(values['second_injection']?.sensitivity?.['second_if']?.absolute).toBeCloseTo(-0.001, 15);
    expect(values['crystal']?.sensitivity).not.toHaveProperty('channel');
  });

  it('add up in the worst way, both sides apart', () => {
    const both = compile([
      input('a1', { home: 10, tolerance: { kind: 'absolute', plus: 1, minus: 2 } }),
      input('b1', { home: 20, tolerance: { kind: 'percent', plus: 10, minus: 5 } }),
      derived('gap', 'b1 - a1'),
    ]);
    expect(evaluate(both, {}, { tolerances: true }).values['gap']).toMatchObject({
      value: 10,
      low: 10 - 1 - 1,
      high: 10 + 2 + 2,
    });
  });

  it('give a derived quantity its own tolerance, which it passes on', () => {
    const chain = compile([
      input('x1', { unit: 'MHz', home: 8.1 }),
      derived('x2', 'x1', { unit: 'MHz', tolerance: { kind: 'ppm', plus: 5, minus: 5 } }),
      derived('x3', 'x2 * 18', { unit: 'MHz' }),
    ]);
    const { low = 0, high = 0 } = evaluate(chain, {}, { tolerances: true }).values['x3'] ?? {};
    // 5 ppm of 8.1 MHz times 18 is 729 Hz: reference notes on the frequency chain, example C60.
    expect((high - low) / 2).toBeCloseTo(729e-6, 9);
  });

  it('mark what is outside its limits', () => {
    const limited = compile([
      input('x1', { home: 5, limits: { low: 1, high: 6 } }),
      derived('x2', 'x1 * 2', { limits: { high: 11 } }),
    ]);
    expect(evaluate(limited).values['x2']).not.toHaveProperty('limitsBroken');
    expect(evaluate(limited, { x1: 6 }).values).toMatchObject({ x2: { limitsBroken: true } });
    expect(evaluate(limited, { x1: 7 }).values).toMatchObject({ x1: { limitsBroken: true } });
  });
});
