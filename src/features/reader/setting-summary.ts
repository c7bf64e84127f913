import type { Quantity } from '#shared/api/quantities.ts';
import type { LiveValue } from '#shared/calc/describe-value.ts';
import type { LiveStore } from '#src/blocks/live-value/live-store.ts';
import { type PlacedValue, placeValue } from '#src/blocks/live-value/placed-value.ts';

/** `missing` says in few words why there is no value: what is behind another's trouble only names that other. */
export type SummaryRow = { quantity: Quantity; placed: PlacedValue; missing: string | undefined };
export type Summary = { rows: SummaryRow[]; moved: number; outside: number; missing: number; disagreeing: number };

/** The values that the paper prints and that follow from others, and how many stand off the print or outside their limits. */
export function summaryOf(store: LiveStore): Summary {
  const labelOf = (symbol: string): string => store.quantities.find((each) => each.symbol === symbol)?.label || symbol;
  const rows = store.quantities.flatMap((quantity): SummaryRow[] => {
    const value = store.read(quantity.symbol);
    if (quantity.kind !== 'derived' || quantity.printed === undefined || value === undefined) return [];
    return [
      { quantity, placed: placeValue(quantity, value, quantity.printed.text), missing: missingWords(value, labelOf) },
    ];
  });
  const values = store.quantities.flatMap(({ symbol }) => store.read(symbol) ?? []);
  return {
    rows,
    moved: rows.filter(({ placed }) => placed.isMoved).length,
    outside: values.filter(({ limitsBroken }) => limitsBroken === true).length,
    missing: values.filter(({ value }) => value === null).length,
    disagreeing: store.proof.items.filter(({ agrees }) => !agrees).length,
  };
}

function missingWords({ problem }: LiveValue, labelOf: (symbol: string) => string): string | undefined {
  if (problem === undefined) return undefined;
  return problem.cause === undefined ? problem.message : `needs: ${labelOf(problem.cause)}`;
}
