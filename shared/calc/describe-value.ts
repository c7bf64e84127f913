import { isAbout } from '#shared/expressions/compile-expression.ts';
import { fromBase } from '#shared/units/convert.ts';
import { formatLikePrinted, formatQuantity } from '#shared/units/format-quantity.ts';
import type { SpreadVerdict } from './judge-spread.ts';
import type { CalcProblem } from './problem.ts';
import type { Cell } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';
import type { CalcState } from './state.ts';

/** How much an output moves with one input: in its unit per unit of the input, and in ppm per ppm (null where a value is zero). */
export type Sensitivity = { absolute: number; ppm: number | null };

/** A live value. `value`, `low` and `high` are in `unit`, the quantity's own; null and '' where `problem` says why. */
export type LiveValue = {
  value: number | null;
  unit: string;
  /** As the paper would print it, unit included; `printed` is what the paper does print. */
  text: string;
  printed?: string;
  /** Worst case of all tolerances together. */
  low?: number;
  high?: number;
  /** Root sum square of all tolerances: where independent ones are likely to end together. */
  rss?: { low: number; high: number };
  /** Whether the spread stays within what the manual allows; only where it prints limits or a tolerance. */
  verdict?: SpreadVerdict;
  sensitivity?: Record<string, Sensitivity>;
  /** What its expression names directly. */
  dependsOn: string[];
  limitsBroken?: boolean;
  problem?: CalcProblem;
};

export function describeValue({ program, slots, problems }: CalcState, cell: Cell): LiveValue {
  const { definition, slot } = cell;
  const common = {
    unit: definition.unit,
    dependsOn: [...(program.dependsOn.get(definition.symbol) ?? [])],
    ...(definition.printed === undefined ? {} : { printed: definition.printed.text }),
  };
  const problem = problems.get(slot);
  if (problem !== undefined) return { ...common, value: null, text: '', problem };
  const value = fromBase(slots[slot] ?? NaN, cell.unit);
  return {
    ...common,
    value,
    text: textOf(value, definition),
    ...(breaksLimits(value, definition) ? { limitsBroken: true } : {}),
  };
}

/** The paper's form comes first; `display` is for what the paper does not print. */
const textOf = (value: number, { printed, unit, display }: QuantityDefinition): string =>
  printed === undefined ? formatQuantity(value, unit, display) : formatLikePrinted(value, unit, printed.text);

function breaksLimits(value: number, { limits }: QuantityDefinition): boolean {
  const { low = -Infinity, high = Infinity } = limits ?? {};
  return (value < low && !isAbout(value, low)) || (value > high && !isAbout(value, high));
}
