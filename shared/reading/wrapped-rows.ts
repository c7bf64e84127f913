import { zoneAround } from '#shared/document/define-block.ts';
import type { FoundRow, FoundTable } from './find-tables.ts';
import { bottomOf, middleOf, rightOf } from './lines.ts';
import type { ReadingWord } from './reading.ts';

/** A further line of a row stands this close below it, in letter heights. */
const closeLetters = 1.6;
/** The room that a word needs before it, in letter heights. */
const wordGapLetters = 0.4;

type Columns = FoundTable['columns'];

/** A row with text in one later cell only, close below another, is the second line of that one: a wrapped description. */
export function joinWrapped(rows: readonly FoundRow[], columns: Columns, letter: number): FoundRow[] {
  const rightmost = columns.map((_, column) =>
    Math.max(0, ...rows.flatMap(({ cells }) => (cells[column] ?? []).map(({ box }) => rightOf(box)))),
  );
  return rows.reduce<FoundRow[]>((joined, row) => {
    const above = joined.at(-1);
    const column = onlyCell(row);
    if (above === undefined || joined.length === 1 || column < 1) return [...joined, row];
    const isClose = middleOf(row.zone) - bottomOf(above.zone) < letter * closeLetters;
    const words = { above: above.cells[column] ?? [], own: row.cells[column] ?? [] };
    if (!isClose || (isTitle(words.own) && !isCut(words, rightmost[column] ?? 0, letter))) return [...joined, row];
    const cells = above.cells.map((cell, index) => [...cell, ...(row.cells[index] ?? [])]);
    return [...joined.slice(0, -1), { cells, zone: zoneAround([above.zone, row.zone]) }];
  }, []);
}

/** The index of a row's only filled cell; -1 where it has none or more. */
function onlyCell({ cells }: FoundRow): number {
  const filled = cells.flatMap((cell, index) => (cell.length > 0 ? [index] : []));
  return filled.length === 1 ? (filled[0] ?? -1) : -1;
}

/** All capitals and no figures: the heading of a section may stand in the column of descriptions. */
const isTitle = (words: readonly ReadingWord[]): boolean =>
  words.length <= 4 && words.every(({ text }) => /^[A-Z][A-Z&,.'-]{2,}$/.test(text));

/** Whether the line above had no room for the word that begins this one, and does not look finished. */
function isCut(
  { above, own }: { above: readonly ReadingWord[]; own: readonly ReadingWord[] },
  rightmost: number,
  letter: number,
): boolean {
  const [last, first] = [above.at(-1), own[0]];
  if (last === undefined || first === undefined) return false;
  const hasRoom = rightOf(last.box) + letter * wordGapLetters + first.box[2] <= rightmost;
  return !hasRoom && /[,:-]$|^[A-Z,-]+$/.test(last.text);
}
