import type { Quantity } from '#shared/api/quantities.ts';
import { isSame } from '#shared/kit/compare-lists.ts';

const fieldWords = {
  symbol: 'symbol',
  label: 'name',
  kind: 'kind',
  unit: 'unit',
  expression: 'formula',
  home: 'home value',
  integer: 'whole numbers only',
  printed: 'as printed',
  tolerance: 'tolerance',
  display: 'decimals shown',
  limits: 'limits',
  pageId: 'page it stands on',
  zone: 'place on the scan',
} as const satisfies Partial<Record<keyof Quantity, string>>;

type Field = keyof typeof fieldWords;
export type ChangedField = { field: string; before: string; after: string };

/** Each property of a quantity that differs, in words. Where it stands on a scan is said without the pixels. */
export const changedFields = (before: Quantity, after: Quantity): ChangedField[] =>
  (Object.keys(fieldWords) as Field[])
    .filter((field) => !isSame(before[field] ?? null, after[field] ?? null))
    .map((field) => ({ field: fieldWords[field], before: wordsFor(before, field), after: wordsFor(after, field) }));

function wordsFor(quantity: Quantity, field: Field): string {
  const value = quantity[field] ?? '';
  if (value === '') return 'none';
  if (field === 'zone' || field === 'pageId') return 'another';
  if (field === 'home' && typeof value === 'number') return `${value} ${quantity.unit}`.trim();
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return typeof value === 'object' ? partsOf(field, value) : String(value);
}

/** `low 156, high 157`; of what is printed, the text alone. */
const partsOf = (field: Field, value: object): string =>
  Object.entries(value)
    .map(([name, each]) => (field === 'printed' ? String(each) : `${name} ${String(each)}`))
    .join(', ');

/** A quantity in one line: its formula, or its value at home. */
export const quantityLine = (quantity: Quantity): string =>
  quantity.kind === 'derived' ? `= ${quantity.expression ?? ''}` : wordsFor(quantity, 'home');
