import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { ColumnMeaning } from './blocks/table.ts';
import type { DocNode } from './define-block.ts';
import { type PageTable, tablesOf } from './tables.ts';

export type PartValue = { magnitude: number; unit: string; tolerance: string | null };
export type Part = {
  refDes: string;
  partNumber: string;
  description: string;
  quantity: string;
  value: PartValue | null;
  tableId: string;
  row: number;
  problems: string[];
};

/** A reference designator or a list or range of them: C12, R1-R5, "L3, L4", V101A. */
const designators = /^[A-Z]{1,3}\d{1,4}[A-Z]?(\s*[,-]\s*[A-Z]{0,3}\d{1,4}[A-Z]?)*$/;

/** Every row of the parts lists of a page, with what is odd about it said in words. */
export const partsOf = (document: DocNode): Part[] =>
  tablesOf(document)
    .filter(({ kind }) => kind === 'parts')
    .flatMap((table) => table.rows.map((cells, row) => partOf(table, cells, row)));

function partOf(table: PageTable, cells: readonly string[], row: number): Part {
  const of = (meaning: ColumnMeaning): string =>
    table.columns
      .flatMap((column, index) => (column.meaning === meaning ? [cells[index] ?? ''] : []))
      .join(' ')
      .trim();
  const refDes = of('refDes');
  const [description, quantity] = [of('description'), of('quantity')];
  return {
    refDes,
    partNumber: of('partNumber'),
    description,
    quantity,
    value: valueOf([of('value'), of('tolerance')].join(' ').trim()) ?? valueOf(description),
    tableId: table.id,
    row,
    problems: problemsOf({ refDes, description, quantity }),
  };
}

function problemsOf({
  refDes,
  description,
  quantity,
}: {
  refDes: string;
  description: string;
  quantity: string;
}): string[] {
  const problems: string[] = [];
  if (refDes !== '' && !designators.test(refDes))
    problems.push(`"${refDes}" does not look like a reference designator.`);
  if (refDes === '' && description === '') problems.push('This row has neither a designator nor a description.');
  if (quantity !== '' && !/^\d+$|^(REF|AR)\.?$/i.test(quantity))
    problems.push(`"${quantity}" does not look like a quantity.`);
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
