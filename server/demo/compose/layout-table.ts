import type { PartsRow, PartsTableBlock, TableBlock } from '#server/demo/content/types.ts';
import { centred, type Cursor } from './cursor.ts';
import { columnWidth, leftEdge, lineHeight, textWidth } from './sheet.ts';
import { wrap } from './wrap.ts';

type AnyTable = PartsTableBlock | TableBlock;

/** A column of the grid: where it begins and how many characters it holds. */
interface Column {
  readonly x: number;
  readonly characters: number;
}

interface Grid {
  readonly columns: readonly Column[];
  readonly ruled: boolean;
  readonly leaders: boolean;
  readonly left: number;
  readonly right: number;
}

const ruledRowGap = 14;
const shortestLeader = 4;

export function layOutTable(cursor: Cursor, table: AnyTable): void {
  if (table.caption !== '') {
    cursor.y += 0.3 * lineHeight;
    cursor.placed.push(centred(cursor, table.caption, { y: cursor.y }));
    cursor.y += 1.5 * lineHeight;
  }
  const rows = rowsOf(table);
  const grid = gridFor(cursor, table, rows);
  const top = cursor.y - lineHeight + 6;
  if (grid.ruled) ruleAcross(cursor, grid, top);
  placeCells(cursor, grid, { cells: table.columns.map(({ heading }) => heading), underlined: !grid.ruled });
  if (!grid.ruled) cursor.y += 0.2 * lineHeight;
  for (const row of rows) placeRow(cursor, grid, row);
  if (grid.ruled) ruleDown(cursor, grid, top);
  cursor.y += lineHeight;
}

function rowsOf(table: AnyTable): readonly PartsRow[] {
  return table.kind === 'parts-table' ? table.rows : table.rows.map((cells) => ({ kind: 'body', cells }));
}

function placeRow(cursor: Cursor, grid: Grid, row: PartsRow): void {
  if (row.kind === 'body') return placeCells(cursor, grid, row);
  const x = grid.ruled ? (grid.columns[1]?.x ?? grid.left) : grid.left;
  if (!grid.ruled) cursor.y += 0.45 * lineHeight;
  const text = row.cells[0] ?? '';
  cursor.placed.push({ kind: 'text', x, y: cursor.y, text, pitch: cursor.pitch, underlined: !grid.ruled });
  if (!grid.ruled) cursor.y += 0.25 * lineHeight;
  endRow(cursor, grid);
}

function placeCells(
  cursor: Cursor,
  grid: Grid,
  row: { readonly cells: readonly string[]; readonly underlined?: boolean },
): void {
  const top = cursor.y;
  let bottom = top;
  row.cells.forEach((cell, index) => {
    const column = grid.columns[index];
    if (column === undefined) return;
    wrap(cell, column.characters).forEach((line, number) => {
      const y = top + number * lineHeight;
      const text = grid.leaders && number === 0 && row.underlined !== true ? led(grid, index, line) : line;
      cursor.placed.push({
        kind: 'text',
        x: column.x,
        y,
        text,
        pitch: cursor.pitch,
        underlined: row.underlined === true,
      });
      bottom = Math.max(bottom, y);
    });
  });
  cursor.y = bottom;
  endRow(cursor, grid);
}

function endRow(cursor: Cursor, grid: Grid): void {
  if (grid.ruled) {
    ruleAcross(cursor, grid, cursor.y + ruledRowGap + 3);
    cursor.y += ruledRowGap;
  }
  cursor.y += lineHeight;
}

/** Dots from the end of a description to the part number. */
function led(grid: Grid, index: number, text: string): string {
  const column = grid.columns[index];
  if (column === undefined || index !== 1) return text;
  const dots = column.characters - text.length - 1;
  return dots < shortestLeader ? text : `${text} ${'.'.repeat(dots)}`;
}

function gridFor(cursor: Cursor, table: AnyTable, rows: readonly PartsRow[]): Grid {
  const gap = table.ruled ? 2 : 3;
  const total = Math.floor(textWidth / columnWidth(cursor.pitch));
  const bodies = rows.filter(({ kind }) => kind === 'body');
  const natural = table.columns.map(({ heading }, index) =>
    Math.max(heading.length, ...bodies.map(({ cells }) => cells[index]?.length ?? 0)),
  );
  const widths = fitted(natural, total - gap * natural.length);
  const leaders = table.kind === 'parts-table' && table.leaders;
  // A list with leaders takes the whole width; any other table is spread a little and stands in the middle.
  const spare = total - widths.reduce((sum, width) => sum + width + gap, 0);
  if (leaders && widths[1] !== undefined) widths[1] += spare;
  const roomy = leaders ? 0 : Math.min(6, Math.floor(spare / widths.length));
  return placeColumns(cursor, { widths, gap: gap + roomy, table, leaders });
}

function placeColumns(
  cursor: Cursor,
  plan: { widths: readonly number[]; gap: number; table: AnyTable; leaders: boolean },
): Grid {
  const { widths, gap, table, leaders } = plan;
  const unit = columnWidth(cursor.pitch);
  const width = widths.reduce((sum, each) => sum + each + gap, 0) * unit;
  const left = leftEdge + Math.max(0, (textWidth - width) / 2);
  let x = left + (gap / 2) * unit;
  const columns = widths.map((characters) => {
    const column = { x, characters };
    x += (characters + gap) * unit;
    return column;
  });
  return { columns, ruled: table.ruled, leaders, left, right: left + width };
}

/** The widest column gives way until the row fits. */
function fitted(natural: readonly number[], available: number): number[] {
  const widths = [...natural];
  while (widths.reduce((sum, width) => sum + width, 0) > available) {
    const widest = widths.indexOf(Math.max(...widths));
    widths[widest] = (widths[widest] ?? 0) - 1;
  }
  return widths;
}

function ruleAcross(cursor: Cursor, grid: Grid, y: number): void {
  cursor.placed.push({ kind: 'rule', from: [grid.left, y], to: [grid.right, y] });
}

function ruleDown(cursor: Cursor, grid: Grid, top: number): void {
  const bottom = cursor.y - lineHeight + 3;
  const margin = (grid.columns[0]?.x ?? grid.left) - grid.left;
  for (const x of [...grid.columns.map((column) => column.x - margin), grid.right]) {
    cursor.placed.push({ kind: 'rule', from: [x, top], to: [x, bottom] });
  }
}
