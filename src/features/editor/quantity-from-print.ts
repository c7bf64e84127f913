import type { QuantityInput } from '#shared/api/quantities.ts';
import type { PrintedNumber } from './printed-number.ts';

/** What a person says of a new quantity; the rest is taken from the print. */
export type QuantityDraft = Pick<QuantityInput, 'symbol' | 'label' | 'kind' | 'unit'> & { expression: string };

/** The unit in the spelling of the page: `mc` where the page says mc. */
export function printedUnit({ text, parsed }: PrintedNumber): string {
  const behind = /^[\s]*([A-Za-zµμΩ°%/]+)/.exec(text.slice(parsed.layout.end))?.[1];
  return parsed.unit === '' ? '' : (behind ?? parsed.unit);
}

/** The quantity to add for a printed number, as it has been named and described. */
export function inputFrom(
  { label, symbol, kind, unit, expression }: QuantityDraft,
  { text, zone, parsed }: PrintedNumber,
  pageId: string,
): QuantityInput {
  return {
    label: label.trim(),
    symbol: symbol.trim(),
    kind,
    unit: unit.trim(),
    printed: { text },
    pageId,
    zone,
    ...(kind === 'derived' ? { expression } : { home: text.replace(/\s?±.*$/, '') }),
    ...(kind === 'input' && unit.trim() === '' && Number.isInteger(parsed.magnitude) ? { integer: true } : {}),
  };
}
