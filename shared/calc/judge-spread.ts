import { isAbout } from '#shared/expressions/compile-expression.ts';
import { fromBase, toBase } from '#shared/units/convert.ts';
import { findUnit, type UnitDefinition } from '#shared/units/definitions.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { QuantityDefinition } from './quantity.ts';
import type { Bounds, Spread } from './spread.ts';

/** `allowed` is in the quantity's unit, a side without a limit is left out. */
export type SpreadVerdict = { allowed: Partial<Bounds>; worstCase: 'pass' | 'fail'; rss: 'pass' | 'fail' };

/**
 * Holds a spread against what the manual allows: the limits of the quantity, or else the tolerance printed with it
 * (`10.7 mc ± 5 kc`). Simple acceptance, without a guard band: ILAC-G8:09/2019, clause 4.2.1. Undefined where neither is there.
 */
export function judgeSpread(definition: QuantityDefinition, spread: Spread): SpreadVerdict | undefined {
  const allowed = definition.limits ?? printedBounds(definition);
  if (allowed === undefined || (allowed.low === undefined && allowed.high === undefined)) return undefined;
  const { low = -Infinity, high = Infinity } = allowed;
  const judge = (bounds: Bounds): 'pass' | 'fail' =>
    (bounds.low >= low || isAbout(bounds.low, low)) && (bounds.high <= high || isAbout(bounds.high, high))
      ? 'pass'
      : 'fail';
  return {
    allowed: {
      ...(allowed.low === undefined ? {} : { low: allowed.low }),
      ...(allowed.high === undefined ? {} : { high: allowed.high }),
    },
    worstCase: judge(spread),
    rss: judge(spread.rss),
  };
}

const shares = { percent: 1e-2, ppm: 1e-6 } as const;

/** From the printed text, in the quantity's own unit. */
function printedBounds({ printed, unit: ownUnit }: QuantityDefinition): Bounds | undefined {
  const parsed = printed === undefined ? undefined : parseQuantity(printed.text);
  if (parsed?.ok !== true) return undefined;
  const { magnitude, tolerance, unit, range } = parsed.value;
  const [from, to] = [findUnit(unit === '' ? ownUnit : unit), findUnit(ownUnit)];
  if (!from.ok || !to.ok || from.value.dimension !== to.value.dimension) return undefined;
  const convert = (value: number, written: UnitDefinition): number => fromBase(toBase(value, written), to.value);
  if (range !== undefined) return { low: convert(range.low, from.value), high: convert(range.high, from.value) };
  if (tolerance === undefined) return undefined;
  const middle = convert(magnitude, from.value);
  const its = findUnit(tolerance.unit ?? from.value.symbol);
  const reach = (side: number): number =>
    tolerance.kind === 'absolute'
      ? convert(side, its.ok ? its.value : from.value)
      : Math.abs(middle) * side * shares[tolerance.kind];
  return { low: middle - reach(tolerance.minus), high: middle + reach(tolerance.plus) };
}
