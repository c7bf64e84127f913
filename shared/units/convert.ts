import { Decimal } from 'decimal.js';
import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { dimensionOf, findUnit, type UnitDefinition, type UnitProblem } from './definitions.ts';
import { isSameDimension } from './dimensions.ts';

/** 40 digits: a double's 17 and the widest factor of the table together stay exact. Its own copy, so nobody else's settings matter. */
export const ExactDecimal = Decimal.clone({
  precision: 40,
  rounding: Decimal.ROUND_HALF_UP,
  toExpNeg: -40,
  toExpPos: 40,
});
export type ExactDecimal = Decimal;

/** A number or decimal text in `unit`, as a double in the base unit; one rounding only, so 156.6 MHz is 156600000 Hz exactly. */
export const toBase = (magnitude: number | string, unit: UnitDefinition): number => {
  if (typeof magnitude === 'number' && !Number.isFinite(magnitude)) return magnitude;
  return new ExactDecimal(magnitude).times(unit.factor).toNumber();
};

export const fromBase = (base: number, unit: UnitDefinition): number => {
  if (unit.factor === '1' || !Number.isFinite(base)) return base;
  return new ExactDecimal(base).div(unit.factor).toNumber();
};

/** Converts between any two spellings of units of one dimension. */
export function convert(value: number, fromUnit: string, toUnit: string): Result<number, UnitProblem> {
  const from = findUnit(fromUnit);
  if (!from.ok) return from;
  const to = findUnit(toUnit);
  if (!to.ok) return to;
  if (!isSameDimension(dimensionOf(from.value), dimensionOf(to.value))) {
    return fail({
      code: 'unit-mismatch',
      message: `"${fromUnit}" is a ${from.value.dimension}, "${toUnit}" is a ${to.value.dimension}.`,
    });
  }
  if (from.value === to.value) return succeed(value);
  return succeed(fromBase(toBase(value, from.value), to.value));
}
