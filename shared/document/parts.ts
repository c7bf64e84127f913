import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { ColumnMeaning } from './blocks/table.ts';
import type { DocNode } from './define-block.ts';
import { designatorsIn } from './designator-list.ts';
import { type PageTable, tablesOf } from './tables.ts';

export type PartValue = { magnitude: number; unit: string; tolerance: string | null };
export type Part = {
  /** As printed; `designators` has its ranges written out, and is empty where it is no list of designators. */
  refDes: string;
  designators: string[];
  partNumber: string;
  description: string;
  quantity: string;
  value: PartValue | null;
  /** The designator of the part that this one is said to be the same as. */
  sameAs: string | null;
  tableId: string;
  row: number;
  problems: string[];
};

/** Signs for "as in the row above": ditto marks, as typed, printed and misread, and the words. */
const ditto = /^(?:["\u201c\u201d\u3003]|''|\u2019\u2019|-?\s?do\.?\s?-?|ditto\.?)$/i;
const same = /\bsame as ([A-Z]{1,3}\d{1,4}[A-Z]?)\b/i;

/**
 * Every row of the parts lists of a page, with what is odd about it said in words. A ditto mark stands for what the row
 * above has; `above` is the last row of the page before, for a list that goes on.
 */
export function partsOf(document: DocNode, above: readonly string[] = []): Part[] {
  return tablesOf(document)
    .filter(({ kind }) => kind === 'parts')
    .flatMap((table, index) =>
      withoutDittos(table, index === 0 ? above : []).map((cells, row) => partOf(table, cells, row)),
    );
}

/** The last row of a page's parts lists, dittos resolved; empty where it has none. */
export function lastPartRow(document: DocNode, above: readonly string[]): string[] {
  const tables = tablesOf(document).filter(({ kind }) => kind === 'parts');
  const last = tables.at(-1);
  return last === undefined ? [] : (withoutDittos(last, tables.length === 1 ? above : []).at(-1) ?? []);
}

function withoutDittos({ rows, columns }: PageTable, above: readonly string[]): string[][] {
  let before = above;
  return rows.map((cells) => {
    const resolved = cells.map((cell, at) =>
      columns[at]?.meaning !== 'refDes' && ditto.test(cell.trim()) ? (before[at] ?? cell) : cell,
    );
    before = resolved;
    return resolved;
  });
}

function partOf(table: PageTable, cells: readonly string[], row: number): Part {
  const of = (meaning: ColumnMeaning): string =>
    table.columns
      .flatMap((column, index) => (column.meaning === meaning ? [cells[index] ?? ''] : []))
      .join(' ')
      .trim();
  const part = {
    refDes: of('refDes'),
    designators: designatorsIn(of('refDes')) ?? [],
    partNumber: of('partNumber'),
    description: of('description'),
    quantity: of('quantity'),
  };
  return {
    ...part,
    value: valueOf([of('value'), of('tolerance')].join(' ').trim()) ?? valueOf(part.description),
    sameAs: same.exec([part.description, part.partNumber, of('remarks')].join(' '))?.[1]?.toUpperCase() ?? null,
    tableId: table.id,
    row,
    problems: problemsOf(part),
  };
}

type Read = Pick<Part, 'refDes' | 'designators' | 'description' | 'quantity'>;

function problemsOf({ refDes, designators, description, quantity }: Read): string[] {
  const problems: string[] = [];
  if (refDes !== '' && designators.length === 0)
    problems.push(`"${refDes}" does not look like a reference designator.`);
  if (refDes === '' && description === '') problems.push('This row has neither a designator nor a description.');
  if (quantity !== '' && !/^\d+$|^(REF|AR)\.?$/i.test(quantity))
    problems.push(`"${quantity}" does not look like a quantity.`);
  // One part may serve several designators' places ("1" beside V1A, V1B), so only more than one is held to their number.
  if (
    designators.length > 1 &&
    /^\d+$/.test(quantity) &&
    Number(quantity) > 1 &&
    Number(quantity) !== designators.length
  )
    problems.push(`The quantity is ${quantity}, but ${designators.length} designators are named.`);
  return problems;
}

/** The first quantity in a description: "Capacitor, mica, 15 µµf ±5%". A number without a unit is no value. */
function valueOf(text: string): PartValue | null {
  for (const start of text.matchAll(/(?<![\w.-])[.\d]/g)) {
    const parsed = parseQuantity(text.slice(start.index).split(/[;,](?!\d)/)[0] ?? '');
    if (!parsed.ok || parsed.value.unit === '') continue;
    const { magnitude, unit, tolerance } = parsed.value;
    return { magnitude, unit, tolerance: tolerance === undefined ? null : toleranceText(tolerance) };
  }
  return null;
}

function toleranceText({
  plus,
  minus,
  kind,
  unit,
}: {
  plus: number;
  minus: number;
  kind: string;
  unit?: string;
}): string {
  const sign = kind === 'percent' ? '%' : kind === 'ppm' ? ' ppm' : ` ${unit ?? ''}`;
  return plus === minus ? `±${plus}${sign}` : `+${plus} -${minus}${sign}`;
}
