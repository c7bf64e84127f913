import type { TableColumn } from '#shared/document/blocks/table.ts';
import type { FoundRow, FoundTable } from './find-tables.ts';
import type { ReadingWord } from './reading.ts';
import { columnMeaning } from './type-columns.ts';

export type RowRole = 'head' | 'section' | 'body';
/** A found table with its rows sorted into heading, section and body rows, and its columns typed. */
export type TypedTable = { found: FoundTable; roles: RowRole[]; body: FoundRow[]; columns: TableColumn[] };

export const textOfCell = (words: readonly ReadingWord[]): string =>
  words
    .map(({ text }) => text)
    .filter((text) => text !== '')
    .join(' ');
const filledCells = ({ cells }: FoundRow): ReadingWord[][] => cells.filter((cell) => cell.length > 0);

export function typedTable(found: FoundTable): TypedTable {
  const headCount = headRows(found.rows);
  const roles = found.rows.map((row, index): RowRole =>
    index < headCount ? 'head' : isSection(row) ? 'section' : 'body',
  );
  const body = found.rows.filter((_, index) => roles[index] === 'body');
  const columns = found.columns.map((_, column) => {
    const heading = found.rows
      .slice(0, headCount)
      .map(({ cells }) => textOfCell(cells[column] ?? []))
      .join(' ')
      .trim();
    const cells = body.map((row) => textOfCell(row.cells[column] ?? []));
    return { heading, meaning: columnMeaning(heading, cells) };
  });
  return { found, roles, body, columns };
}

/** Heading rows stand at the top and hold words, hardly a digit; a table may have none. */
function headRows(rows: readonly FoundRow[]): number {
  let count = 0;
  while (count < Math.min(3, rows.length - 1)) {
    const cells = filledCells(rows[count] ?? { cells: [], zone: [0, 0, 0, 0] });
    const wordy = cells.filter((cell) => !/\d/.test(textOfCell(cell))).length;
    if (cells.length < 2 || wordy < cells.length * 0.8) break;
    count += 1;
  }
  return count;
}

/** A section heading is alone on its row, in words: "CAPACITORS". */
function isSection(row: FoundRow): boolean {
  const filled = filledCells(row);
  return filled.length === 1 && /^[A-Za-z][A-Za-z ,.&-]{3,}$/.test(textOfCell(filled[0] ?? []));
}
