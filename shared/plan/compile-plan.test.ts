import { describe, expect, it } from 'vitest';
import { compilePlan } from './compile-plan.ts';
import { harbourQuantities, harbourReceiver, planOf, run, singleConversion } from './plans.fixture.ts';

describe('a frequency plan', () => {
  // Carrier minus IF over 96: common practice, no source.
  const receiver = (crystal: string) =>
    singleConversion({ carrier: '2287.5 MHz', crystal, factor: '96', injection: 'low' });

  it('gives the crystal for a carrier', () => {
    const { pinned, values } = run(receiver(''), {
      pin: { symbol: 'plan_mixer1', value: '50 MHz', solveFor: 'plan_y1' },
    });
    expect(pinned?.value.toFixed(6)).toBe('23.307292');
    expect(values['plan_chain']?.value).toBeCloseTo(2237.5, 9);
  });

  it('gives the carrier that a crystal at hand would receive', () => {
    const { pinned } = run(receiver('22.885417 MHz'), {
      pin: { symbol: 'plan_mixer1', value: '50 MHz', solveFor: 'plan_rf' },
    });
    // 96 x 22.885417 + 50: arithmetic.
    expect(pinned?.value).toBeCloseTo(2247.000032, 9);
  });

  it('solves for the channel through the quantities of the manual', () => {
    const { pinned } = run(harbourReceiver, {
      quantities: harbourQuantities,
      pin: { symbol: 'plan_tripler2', value: '146.1 mc', solveFor: 'plan_y1' },
    });
    expect(pinned?.value).toBeCloseTo(146.1 / 9, 9);
    const byChannel = run(harbourReceiver, {
      quantities: harbourQuantities,
      pin: { symbol: 'plan_mixer1', value: '10.9 mc', solveFor: 'channel' },
    });
    // Channel 16 lies 200 kc above channel 12.
    expect(byChannel.pinned).toMatchObject({ value: 16 });
  });

  it('carries a tolerance through to the injection', () => {
    const { values } = run(harbourReceiver, { quantities: harbourQuantities, tolerances: true });
    // 0.002 % of 145.9 mc is 2.918 kc.
    expect((values['plan_tripler2']?.high ?? NaN) - (values['plan_tripler2']?.value ?? NaN)).toBeCloseTo(0.002918, 8);
  });
});

describe('what is wrong with a plan', () => {
  const rf = { id: 'rf', kind: 'input', name: 'Antenna', frequency: '156.6 MHz' };
  const messages = (...stages: Parameters<typeof planOf>) => compilePlan(planOf(...stages), []).problems;

  it.each([
    [
      [{ id: 'x', kind: 'multiplier', name: 'Tripler', factor: '3' }],
      'missing-feed',
      /Multiplier "Tripler" has no signal\. Connect/,
    ],
    [
      [{ id: 'x', kind: 'mixer', name: 'V2', from: ['rf'], product: 'difference', injection: 'low' }],
      'missing-feed',
      /has no injection/,
    ],
    [
      [{ id: 'x', kind: 'filter', name: 'F', from: ['gone'] }],
      'unknown-feed',
      /fed by "gone", which is not in the plan/,
    ],
    [
      [{ id: 'x', kind: 'crystal', name: 'Y1', frequency: '' }],
      'missing-parameter',
      /Crystal "Y1" has no frequency\. Write one/,
    ],
    [
      [{ id: 'x', kind: 'crystal', name: 'Y1', frequency: '16.2' }],
      'missing-unit',
      /16\.2 without a unit\. Write it, like 16\.2 MHz/,
    ],
    [
      [{ id: 'x', kind: 'crystal', name: 'Y1', frequency: '3 v' }],
      'unit-mismatch',
      /is a frequency, but "3 v" is a voltage/,
    ],
    [
      [{ id: 'x', kind: 'crystal', name: 'Y1', frequency: 'carier / 9' }],
      'unknown-symbol',
      /no quantity "carier".*Choose a quantity/,
    ],
    [
      [{ id: 'x', kind: 'multiplier', name: 'M', from: ['rf'], factor: '9 MHz' }],
      'unit-mismatch',
      /the factor of multiplier "M" is a plain number, but "9 MHz" is a frequency/,
    ],
    [[{ id: 'x', kind: 'divider', name: 'D', from: ['rf'], divisor: '' }], 'missing-parameter', /has no divisor/],
    [
      [{ id: 'x', kind: 'crystal', name: 'Y1', frequency: '16 MHz', tolerance: 'some' }],
      'bad-tolerance',
      /like ±20 ppm/,
    ],
    [[{ id: 'rf', kind: 'filter', name: 'F', from: ['rf'] }], 'duplicate-id', /shares the id "rf"/],
  ])('%j is told as %s', (stages, code, message) => {
    const problem = messages(rf, ...(stages as Parameters<typeof planOf>)).find((each) => each.code === code);
    expect(problem?.message).toMatch(message);
  });

  it('names every stage on a ring, by name', () => {
    const ring = messages(
      { id: 'a', kind: 'multiplier', name: 'Doubler', from: ['b'], factor: '2' },
      { id: 'b', kind: 'divider', name: 'Halver', from: ['a'], divisor: '2' },
    );
    expect(ring.map(({ stage, code }) => [stage, code])).toEqual([
      ['a', 'cycle'],
      ['b', 'cycle'],
    ]);
    expect(ring[0]?.message).toBe(
      'Multiplier "Doubler" feeds itself: multiplier "Doubler" is fed by divider "Halver" is fed by multiplier "Doubler". Disconnect one of them.',
    );
  });

  it('finds nothing wrong with the harbour receiver', () => {
    expect(compilePlan(harbourReceiver, harbourQuantities).problems).toEqual([]);
  });
});
