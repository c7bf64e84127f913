import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { builtInTables } from './channel-plans.ts';
import { evaluate } from './evaluate.ts';
import { receiver } from './harbour-receiver.fixture.ts';
import { compile } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';

const program = compile(receiver, builtInTables);
const over = (expression: string, x: Partial<QuantityDefinition> = {}) =>
  compile([
    { symbol: 'x1', label: '', kind: 'input', unit: '', home: 3, ...x },
    { symbol: 'x2', label: '', kind: 'input', unit: '', home: 1 },
    { symbol: 'y1', label: '', kind: 'derived', unit: '', expression },
  ]);
const solveFor = (expression: string, value: number, x: Partial<QuantityDefinition> = {}) =>
  evaluate(over(expression, x), {}, { pin: { symbol: 'y1', value, solveFor: 'x1' } });

describe('holding a derived quantity', () => {
  it('finds the IF that a crystal at hand asks for, exactly', () => {
    const { pinned, values, setting } = evaluate(
      program,
      {},
      { pin: { symbol: 'crystal', value: '16.2 mc', solveFor: 'first_if' } },
    );
    // 156.6 - 9 * 16.2 = 10.8: arithmetic.
    expect(pinned).toMatchObject({
      value: 10.8,
      wanted: 16.2,
      achieved: 16.2,
      error: 0,
      exact: true,
      method: 'affine',
    });
    expect(setting).toEqual({ channel: 12, first_if: 10.8 });
    expect(values['image']).toMatchObject({ text: '135.000 mc' });
    expect(values['first_if']).toMatchObject({ text: '10.8 mc ± 5 kc' });
  });

  it('finds the channel whose crystal is nearest, and says by how much it misses', () => {
    const near = evaluate(program, {}, { pin: { symbol: 'crystal', value: 16.23, solveFor: 'channel' } });
    // Channel 75 is 156.775 MHz: (156.775 - 10.7) / 9 = 16.230556, 556 Hz off; 15 and 16 are 2.2 and 3.3 kHz off.
    expect(near.pinned).toMatchObject({ value: 75, exact: false, method: 'nearest' });
    expect(near.pinned?.error).toBeCloseTo(0.000556, 6);
    expect(near.setting).toMatchObject({ channel: 75 });
    const exact = evaluate(program, {}, { pin: { symbol: 'injection', value: '146.100 mc', solveFor: 'channel' } });
    expect(exact.pinned).toMatchObject({ value: 16, exact: true, error: 0 });
  });

  it.each([
    ['2 * x1 + 1', 8, 3.5, 'affine'],
    ['x1 ^ 2', 2, Math.SQRT2, 'bracketed'],
    ['1 / x1', 1e-6, 1e6, 'bracketed'],
    ['1 / x1', 1e9, 1e-9, 'bracketed'],
    ['sqrt(x1)', 100, 10_000, 'bracketed'],
    ['max(x1, 5) * 2', 14, 7, 'bracketed'],
    ['x1 ^ 3 - x1', -6, -2, 'bracketed'],
  ])('solves %s = %d', (expression, value, x, method) => {
    const { pinned } = solveFor(expression, value);
    expect(pinned).toMatchObject({ method, exact: true });
    expect(Math.abs((pinned?.value ?? NaN) / x - 1)).toBeLessThan(1e-10);
  });

  it.each([
    ['x1 ^ 2 + 1', 0, {}],
    ['x2 + 1', 5, {}],
    ['floor(x1)', 2.5, {}],
    ['1 / x1', 0, {}],
    ['2 * x1', 100, { limits: { low: 0, high: 10 } }],
    ['abs(x1)', -1, {}],
  ])('says plainly that %s = %d has no solution', (expression, value, x) => {
    const { pinned, values, problems, setting } = solveFor(expression, value, x);
    expect(pinned).toBeUndefined();
    expect(problems).toMatchObject([{ code: 'no-solution', symbol: 'x1' }]);
    expect(problems[0]?.message).toMatch(/^No solution: /);
    // Never the old number under a new wish.
    expect(values['x1']).toMatchObject({ value: null, problem: { code: 'no-solution' } });
    expect(setting['x1']).toBeNull();
  });

  it('keeps to whole numbers and to limits', () => {
    expect(solveFor('x1 * 7', 45, { integer: true }).pinned).toMatchObject({
      value: 6,
      error: -3,
      exact: false,
      method: 'nearest',
    });
    expect(solveFor('x1 * 7', 700_000, { integer: true }).pinned).toMatchObject({ value: 100_000, exact: true });
    expect(solveFor('x1 * 7', 45, { integer: true, limits: { low: 0, high: 4 } }).pinned).toMatchObject({
      value: 4,
      error: -17,
    });
    expect(solveFor('x1 ^ 2', 4, { home: 3, limits: { low: -10, high: -1 } }).pinned?.value).toBeCloseTo(-2, 10);
  });

  it.each([
    [{ symbol: 'nothing', value: 1, solveFor: 'x1' }, 'unknown-symbol'],
    [{ symbol: 'y1', value: 1, solveFor: 'y1' }, 'not-an-input'],
    [{ symbol: 'x2', value: 1, solveFor: 'x1' }, 'no-solution'],
    [{ symbol: 'y1', value: 'much', solveFor: 'x1' }, 'not-a-quantity'],
  ])('refuses %o', (pin, code) => {
    expect(evaluate(over('x1'), {}, { pin }).problems).toMatchObject([{ code }]);
  });

  it('is not put off by a large offset that takes the last digits of a small slope', () => {
    const { pinned } = solveFor('x1 * (-37) + (-999993)', 1);
    expect(pinned?.method).toBe('affine');
    expect(pinned?.achieved).toBeCloseTo(1, 8);
  });

  it('meets what it was asked for, whatever the straight line', () => {
    const nonZero = fc.integer({ min: -1000, max: 1000 }).filter((each) => each !== 0);
    fc.assert(
      fc.property(
        nonZero,
        fc.integer({ min: -1e6, max: 1e6 }),
        fc.integer({ min: -1e6, max: 1e6 }),
        (slope, offset, wanted) => {
          const { pinned } = solveFor(`x1 * (${slope}) + (${offset})`, wanted);
          expect(pinned?.method).toBe('affine');
          expect(Math.abs((pinned?.achieved ?? NaN) - wanted)).toBeLessThanOrEqual(
            1e-9 * Math.max(1, Math.abs(wanted), Math.abs(offset)),
          );
        },
      ),
    );
  });
});
