import type { DocNode } from '#shared/document/define-block.ts';
import type { FoundRow, FoundTable } from './find-tables.ts';
import { inlineOf } from './inline.ts';
import { zoneAround } from './lines.ts';
import type { ReadingWord } from './reading.ts';
import { columnMeaning, tableKind } from './type-columns.ts';

type RowRole = 'head' | 'section' | 'body';

const textOfCell = (words: readonly ReadingWord[]): string => words.map(({ text }) => text).join(' ');
const filledCells = ({ cells }: FoundRow): ReadingWord[][] => cells.filter((cell) => cell.length > 0);

/** A table block from a found table: its rows sorted into heading, section and body rows, and its columns typed. */
export function tableBlock(found: FoundTable, id: string): DocNode {
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
    return {
      heading,
      meaning: columnMeaning(
        heading,
        body.map(({ cells }) => textOfCell(cells[column] ?? [])),
      ),
    };
  });
  return {
    type: 'table',
    attrs: { id, zone: found.zone, kind: tableKind(columns.map(({ meaning }) => meaning)), columns },
    content: found.rows.map((row, index) => rowNode(row, roles[index] ?? 'body')),
  };
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

function rowNode({ cells, zone }: FoundRow, role: RowRole): DocNode {
  const type = role === 'head' ? 'tableHeader' : 'tableCell';
  return {
    type: 'tableRow',
    attrs: { role, zone },
    content: cells.map((words) => ({
      type,
      attrs: {
        zone: words.length === 0 ? null : zoneAround(words.map(({ box }) => box)),
        colspan: 1,
        rowspan: 1,
        colwidth: null,
      },
      content: [{ type: 'paragraph', attrs: { id: null, zone: null }, content: inlineOf(words) }],
    })),
  };
}
