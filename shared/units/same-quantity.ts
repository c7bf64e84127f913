import { ExactDecimal } from './convert.ts';
import { dimensionOf, findUnit } from './definitions.ts';
import { dimensionKey } from './dimensions.ts';
import { parseQuantity } from './parse-quantity.ts';
import type { ParsedQuantity } from './parsed-quantity.ts';

/** Digits that make two quantities the same for a search: 455 kc and 0.455 MHz, not 455 kc and 455.001 kc. */
const searchDigits = 9;

/** Normal form of a quantity for search, `frequency:455000`; undefined where the text is no quantity, or a range of them. */
export function searchKey(
  quantity: string | Pick<ParsedQuantity, 'decimalText' | 'unit' | 'range'>,
): string | undefined {
  const parsed = typeof quantity === 'string' ? parseQuantity(quantity) : { ok: true as const, value: quantity };
  if (!parsed.ok || parsed.value.range !== undefined) return undefined;
  const unit = findUnit(parsed.value.unit);
  if (!unit.ok) return undefined;
  const base = new ExactDecimal(parsed.value.decimalText).times(unit.value.factor).toSignificantDigits(searchDigits);
  return `${dimensionKey(dimensionOf(unit.value))}:${base.isZero() ? '0' : base.toString()}`;
}

export function sameQuantity(a: string, b: string): boolean {
  const key = searchKey(a);
  return key !== undefined && key === searchKey(b);
}
