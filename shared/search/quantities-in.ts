import { parseQuantity } from '#shared/units/parse-quantity.ts';
import { searchKey } from '#shared/units/same-quantity.ts';

export type FoundQuantity = { key: string; start: number; end: number };

/** A number and what directly follows it; the reader of quantities decides how much of that is its unit. */
const candidate = /(?<![\w.])[+-]?(?:\d[\d,]*(?:\.\d+)?|\.\d+)\s?[A-Za-zµμΩ°%]+/gu;

/** Every quantity with a unit in a text, in the normal form under which it is found however it was written. */
export function quantitiesIn(text: string): FoundQuantity[] {
  return [...text.matchAll(candidate)].flatMap((match) => {
    const key = keyOf(match[0]);
    return key === null ? [] : [{ key, start: match.index, end: match.index + match[0].length }];
  });
}

/** The normal form of what was typed, when all of it is one quantity with a unit; else null. */
export function keyOf(text: string): string | null {
  const parsed = parseQuantity(text.trim());
  if (!parsed.ok || parsed.value.unit === '' || parsed.value.tolerance !== undefined) return null;
  return searchKey(parsed.value) ?? null;
}
