import { toBase } from '#shared/units/convert.ts';
import { findUnit } from '#shared/units/definitions.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';

/** A number as a manual prints it, in the order of reading. */
export type PrintedNumber = {
  id: string;
  /** A quantity that it already stands for; formulas then use the symbol. */
  symbol?: string;
  text: string;
  /** In the base unit of its dimension (Hz, V, ...). */
  value: number;
  /** `frequency`, `plain number`: the name of its dimension. */
  dimension: string;
  unit: string;
  /** One unit of the last printed digit, in the base unit. */
  grain: number;
  page: string;
  /** What it is, in a word or three; longer ones are left out of sentences. */
  label?: string;
  /** Where it stands in a table: `table` tells tables apart, `title` is what a reader calls it. */
  column?: { table: string; title?: string; name: string; row: number };
};

type Place = Pick<PrintedNumber, 'id' | 'page'> & Partial<Pick<PrintedNumber, 'symbol' | 'label' | 'column'>>;

/** Reads a printed text; undefined where it is no single quantity. */
export function readPrintedNumber(text: string, place: Place): PrintedNumber | undefined {
  const parsed = parseQuantity(text);
  if (!parsed.ok || parsed.value.range !== undefined) return undefined;
  const unit = findUnit(parsed.value.unit);
  if (!unit.ok) return undefined;
  const { decimalText, decimals } = parsed.value;
  return {
    ...place,
    text,
    value: toBase(decimalText, unit.value),
    dimension: unit.value.dimension,
    unit: unit.value.symbol,
    grain: toBase(`1e-${decimals}`, unit.value),
  };
}

/**
 * How round a number is, in base units: the coarsest of 1, 2, 5 and 25 times a power of ten that divides it. Two numbers
 * on a grid of 100 kc meet by chance a hundred times as often as two on a grid of 1 kc, however many zeros are printed.
 */
export function gridOf({ value, grain }: Pick<PrintedNumber, 'value' | 'grain'>): number {
  let count = Math.round(Math.abs(value) / grain);
  let grid = grain;
  while (count !== 0 && count % 10 === 0) {
    count /= 10;
    grid *= 10;
  }
  const step = [25, 5, 2].find((each) => count % each === 0) ?? 1;
  return grid * step;
}
