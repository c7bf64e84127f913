import type { ColumnMeaning } from '#shared/document/blocks/table.ts';
import { type CountedCell, mendCounts } from './counts.ts';
import { mendDesignators } from './designator-column.ts';
import { findTables } from './find-tables.ts';
import { type Mended, applied } from './mended.ts';
import type { ReadingWord } from './reading.ts';
import { mendSeries } from './series.ts';
import { commonShapes, mendPunctuation, mendShape } from './shapes.ts';
import { withoutSpecks } from './specks.ts';
import { type TypedTable, typedTable } from './typed-table.ts';

/** What words of a column were made into, by its meaning. */
export type Mending = Map<ReadingWord, Mended>;
export type Cells = readonly (readonly ReadingWord[])[];

const menders: Partial<Record<ColumnMeaning, (cells: Cells) => Mending>> = {
  refDes: mendDesignators,
  partNumber: mendPartNumbers,
  frequency: mendFrequencies,
  channel: (cells) => mendSeries(cells),
};

/** Mends words in tables by what their column holds: designators, part numbers, figures, counts. Other words stay. */
export function mendTables(words: readonly ReadingWord[]): ReadingWord[] {
  let mended = [...words];
  // Counts are checked against designators, so those come first; words are new objects each time.
  for (const step of [mendColumns, mendQuantities]) {
    const changes = new Map(findTables(withoutSpecks(mended)).flatMap((found) => [...step(typedTable(found))]));
    mended = mended.map((word) => applied(word, changes.get(word) ?? null));
  }
  return mended;
}

const cellsOf = ({ body }: TypedTable, column: number): ReadingWord[][] => body.map(({ cells }) => cells[column] ?? []);

const mendColumns = (table: TypedTable): Mending =>
  new Map(table.columns.flatMap(({ meaning }, column) => [...(menders[meaning]?.(cellsOf(table, column)) ?? [])]));

function mendQuantities(table: TypedTable): Mending {
  const at = table.columns.findIndex(({ meaning }) => meaning === 'quantity');
  const names = table.columns.findIndex(({ meaning }) => meaning === 'refDes');
  if (at < 0) return new Map();
  const counted = table.body.map(({ cells }): CountedCell => ({
    words: cells[at] ?? [],
    of: (cells[names] ?? []).map(({ text }) => text).join(' '),
  }));
  return mendCounts(counted);
}

const onlyWords = (cells: Cells): ReadingWord[] => cells.flatMap((cell) => (cell.length === 1 ? cell : []));

function mendPartNumbers(cells: Cells): Mending {
  const words = onlyWords(cells);
  const shapes = commonShapes(words.map(({ text }) => text));
  return mendingOf(words, ({ text }) => mendShape(text, shapes));
}

/** Figures of one column have the same decimals; what is left then stands out from the row of its neighbours. */
function mendFrequencies(cells: Cells): Mending {
  const words = onlyWords(cells);
  const shapes = commonShapes(words.map(({ text }) => text));
  const byShape = mendingOf(words, ({ text }) => mendShape(text, shapes) ?? mendPunctuation(text, shapes));
  for (const cell of cells.filter(({ length }) => length > 1)) joinParts(cell, shapes, byShape);
  return new Map([...byShape, ...mendSeries(cells, byShape)]);
}

/** A number that was read in two parts is one where the parts together have the column's shape. */
function joinParts(cell: readonly ReadingWord[], shapes: ReadonlySet<string>, into: Mending): void {
  const [first, ...rest] = cell;
  const whole = cell.map(({ text }) => text).join('');
  if (first === undefined || mendShape(`${whole} `, shapes)?.text !== whole) return;
  into.set(first, { text: whole, sure: true });
  for (const word of rest) into.set(word, { text: '', sure: true });
}

function mendingOf(words: readonly ReadingWord[], mend: (word: ReadingWord) => Mended | null): Mending {
  return new Map(
    words.flatMap((word) => {
      const mended = mend(word);
      return mended === null ? [] : [[word, mended] as const];
    }),
  );
}
