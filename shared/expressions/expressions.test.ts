import { describe, expect, it } from 'vitest';
import { toBase } from '#shared/units/convert.ts';
import { dimensionOf, findUnit } from '#shared/units/definitions.ts';
import { describeDimension } from '#shared/units/dimensions.ts';
import { checkDimensions } from './check-dimensions.ts';
import { compileExpression } from './compile-expression.ts';
import { explainFailure } from './explain-failure.ts';
import { scope, slots } from './formula.fixture.ts';
import { functionDefinitions } from './functions.ts';
import { symbolObjection } from './names.ts';
import { parseExpression } from './parse-expression.ts';

function compute(text: string): { value: number; dimension: string } {
  const parsed = parseExpression(text);
  if (!parsed.ok) throw new Error(parsed.error.message);
  const dimension = checkDimensions(parsed.value, scope);
  if (!dimension.ok) throw new Error(dimension.error.message);
  return { value: compileExpression(parsed.value, scope)(slots), dimension: describeDimension(dimension.value) };
}

describe('every function in the table', () => {
  it.each(functionDefinitions)('$name gives what its example says', ({ example }) => {
    const unit = findUnit(example.unit);
    expect(unit.ok).toBe(true);
    if (!unit.ok) return;
    const { value, dimension } = compute(example.text);
    expect(value).toBeCloseTo(toBase(example.value, unit.value), 6);
    expect(dimension).toBe(describeDimension(dimensionOf(unit.value)));
  });
});

describe('formulas', () => {
  it.each([
    ['(carrier - first_if) / n', 145.9e6 / 9, 'frequency'],
    ['carrier - 2 * 10.7 MHz', 135.2e6, 'frequency'],
    ['10.7 mc - 455 kc', 10_245_000, 'frequency'],
    ['lookup("plan", channel, "ship") - first_if', 145.9e6, 'frequency'],
    ['channel > 28 ? 1 : 2', 2, 'plain number'],
    ['channel == 12 ? carrier : first_if', 156.6e6, 'frequency'],
    ['-2^2', -4, 'plain number'],
    ['2^-1', 0.5, 'plain number'],
    ['2^3^2', 512, 'plain number'],
    ['-3 dB + level', -110, 'power level'],
    ['level - -100 dBm', -7, 'level difference'],
    ['10 MHz / (2 kHz)', 5000, 'plain number'],
    ['1 / (2 * pi * sqrt(coil * capacitor))', 1 / (2 * Math.PI * Math.sqrt(100e-6 * 253.3e-12)), 'frequency'],
    ['(2 V)^2 / (1 kΩ)', 0.004, 'power'],
    ['12 V / (4.7 k)', 12 / 4700, 'current'],
    ['1 / (1 µs)', 1e6, 'frequency'],
    ['0.1 + 0.2 == 0.3 ? 1 : 0', 1, 'plain number'],
    ['(carrier^2)^(1/2)', 156.6e6, 'frequency'],
  ])('%s', (text, value, dimension) => {
    const result = compute(text);
    expect(Math.abs(result.value / value - 1)).toBeLessThan(1e-14);
    expect(result.dimension).toBe(dimension);
  });

  it('names the quantities it uses, in order', () => {
    expect(parseExpression('b1 + a1 * b1')).toMatchObject({ ok: true, value: { symbols: ['b1', 'a1'] } });
  });

  it.each([
    ['', 'syntax', 0, 0],
    ['1 +', 'syntax', 3, 3],
    ['(carrier', 'syntax', 8, 8],
    ['carrier = 3', 'not-allowed', 8, 9],
    ['5% + 1', 'not-allowed', 1, 2],
    ['carrier first_if', 'syntax', 0, 16],
    ['2 (3)', 'syntax', 0, 4],
    ['10/2 MHz', 'syntax', 0, 8],
    ['3 MHz^2', 'syntax', 0, 5],
    ['3 furlong', 'unknown-unit', 2, 9],
    ['MHz * 2', 'syntax', 0, 3],
    ['sin(carrier)', 'unknown-function', 0, 3],
    ['carrier(2)', 'unknown-function', 0, 7],
    ['sqrt(1, 2)', 'wrong-arguments', 0, 9],
    ['min()', 'wrong-arguments', 0, 3],
    ['lookup(plan, channel, "ship")', 'wrong-arguments', 0, 6],
    ['"plan" + 1', 'not-allowed', 0, 6],
    ['1 < 2 < 3 ? 1 : 2', 'not-allowed', 0, 17],
    ['1 ; 2', 'not-allowed', 2, 3],
    ['a.b', 'not-allowed', 1, 2],
    ['[1]', 'not-allowed', 0, 1],
    ['1 mod 2', 'not-allowed', 2, 5],
    ['2 in', 'not-allowed', 2, 4],
    ['true', 'not-allowed', 0, 4],
    ['not 1', 'not-allowed', 0, 3],
    ['pi MHz', 'syntax', 0, 6],
    ['('.repeat(100) + '1' + ')'.repeat(100), 'too-long', 0, 201],
  ])('"%s" is refused: %s at %d to %d', (text, code, start, end) => {
    const parsed = parseExpression(text);
    expect(parsed.ok ? parsed.value.root : parsed.error).toMatchObject({ code, start, end });
    expect(parsed.ok ? '' : parsed.error.message).toMatch(/column/);
  });

  it.each([
    ['carrier + 1', 'unit-mismatch', 0, 11],
    ['carrier + coil', 'unit-mismatch', 0, 14],
    ['3 + nowhere', 'unknown-symbol', 4, 11],
    ['carrier ^ n', 'unit-mismatch', 10, 11],
    ['2 ^ carrier', 'unit-mismatch', 4, 11],
    ['max(carrier, 3)', 'unit-mismatch', 13, 14],
    ['round(carrier)', 'unit-mismatch', 0, 13],
    ['carrier > 3 ? 1 : 2', 'unit-mismatch', 0, 11],
    ['channel > 3 ? carrier : 2', 'unit-mismatch', 0, 25],
    ['channel ? 1 : 2', 'syntax', 0, 7],
    ['channel > 3', 'unit-mismatch', 0, 11],
    ['level + level', 'unit-mismatch', 0, 13],
    ['lookup("none", channel, "ship")', 'unknown-table', 0, 30],
    ['lookup("plan", channel, "none")', 'unknown-column', 0, 30],
    ['lookup("plan", carrier, "ship")', 'unit-mismatch', 15, 22],
  ])('"%s" does not fit: %s at %d to %d', (text, code, start, end) => {
    const parsed = parseExpression(text);
    expect(parsed.ok && checkDimensions(parsed.value, scope)).toMatchObject({ ok: false, error: { code, start, end } });
  });

  it.each([
    ['carrier / (n - 9)', 'division-by-zero'],
    ['1 + lookup("plan", channel + 17, "ship") / carrier', 'not-in-table'],
    ['sqrt(3 - n)', 'root-of-negative'],
    ['10 ^ 400', 'not-finite'],
    ['n > 3 ? 1 / (n - 9) : 2', 'division-by-zero'],
  ])('"%s" says why it has no value: %s', (text, code) => {
    const parsed = parseExpression(text);
    expect(parsed.ok && explainFailure(parsed.value, scope, slots)).toMatchObject({ code });
  });

  it.each(['MHz', 'k', 'mc', 'sqrt', 'lookup', 'pi', 'mod', '1a', 'a b', 'a-b', '', 'ö'])(
    '"%s" cannot name a quantity',
    (name) => {
      expect(symbolObjection(name)).toBeTypeOf('string');
    },
  );
  it.each(['carrier', 'f', 'C', 'L1', 'R101', 'crystal_2', 'IF1'])('"%s" can name a quantity', (name) => {
    expect(symbolObjection(name)).toBeUndefined();
  });
});
