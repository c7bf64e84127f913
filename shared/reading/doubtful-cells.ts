import { type Zone, zoneAround } from '#shared/document/define-block.ts';
import { findTables } from './find-tables.ts';
import { median, rightOf, rowsByHeight } from './lines.ts';
import type { ReadingWord } from './reading.ts';
import { repairWords } from './repair.ts';
import { withoutSpecks } from './specks.ts';
import { typedTable } from './typed-table.ts';

/** A piece of a cell on one line that is worth reading once more on its own; no words where a cell came out empty. */
export type DoubtfulCell = { zone: Zone; words: ReadingWord[] };

/**
 * Above these confidences a second look at a cell mended as many as it spoilt, on 54 generated pages, and cost as much
 * as all that it is worth: a long description takes as long as ten part numbers.
 */
const doubtfulBelow = 70;
const doubtfulBelowInLong = 50;
const fewestInLong = 5;
/** In columns that are filled to this share an empty cell is worth a look. */
const wellFilledShare = 0.7;
/** A page that is doubtful throughout is not read twice. */
const mostCells = 90;

/** The cells of a page's tables that were read with doubt, or that came out empty in a column that is full. */
export function doubtfulCells(words: readonly ReadingWord[]): DoubtfulCell[] {
  const found = findTables(withoutSpecks(words)).flatMap((table) => {
    const { body } = typedTable(table);
    return table.columns.flatMap((_, column) => {
      const cells = body.map((row) => row.cells[column] ?? []);
      return [
        ...readWithDoubt(cells),
        ...emptyIn(
          cells,
          body.map(({ zone }) => zone),
        ),
      ];
    });
  });
  return found.length > mostCells ? [] : found;
}

const readWithDoubt = (cells: readonly ReadingWord[][]): DoubtfulCell[] =>
  cells
    .flatMap((cell) => rowsByHeight(cell))
    .filter(({ words }) => {
      const below = words.length < fewestInLong ? doubtfulBelow : doubtfulBelowInLong;
      return words.some(({ confidence }) => confidence < below);
    })
    .map(({ words, zone }) => ({ words, zone }));

/** Where the other cells of the column stand; whether there is ink is for the caller to see. */
function emptyIn(cells: readonly ReadingWord[][], rows: readonly Zone[]): DoubtfulCell[] {
  const filled = cells.filter((cell) => cell.length > 0);
  if (filled.length < cells.length * wellFilledShare || filled.length === cells.length) return [];
  const boxes = filled.flatMap((cell) => cell.map(({ box }) => box));
  const left = Math.min(...boxes.map(([x]) => x));
  const right = Math.max(...boxes.map(rightOf));
  const height = median(boxes.map(([, , , h]) => h));
  return cells.flatMap((cell, row) => {
    const [, y = 0, , h = 0] = rows[row] ?? [];
    return cell.length > 0 ? [] : [{ words: [], zone: [left, y, right - left, Math.min(h, height * 1.5)] as Zone }];
  });
}

/**
 * Of two readings of the same piece the more confident one, letter by letter; a lone letter must be surer to count. A
 * second one that loses a sign, or begins with a mark that the first one lacks, is none: of sixteen such that were more
 * confident, on generated pages, not one was right and thirteen spoilt what was.
 */
export function betterReading(first: readonly ReadingWord[], second: readonly ReadingWord[]): readonly ReadingWord[] {
  if (second.length === 0) return first;
  const [before, after] = [first, second].map((words) =>
    repairWords(words)
      .map(({ text }) => text)
      .join(' '),
  ) as [string, string];
  if (signsIn(after) < signsIn(before) || (strayMark.test(after) && !strayMark.test(before))) return first;
  return meanConfidence(second) > meanConfidence(first) + marginOver(first) ? second : first;
}

/** Signs that the engine's model cannot write: found by the picture, or by what stands around them. */
const signsIn = (text: string): number => text.match(/[±µΩ×°¼½¾]/g)?.length ?? 0;
/** What is left of a rule or a leader is read as one of these; no cell begins so. */
const strayMark = /^["“©®_«|¥€]/;

const marginOver = (first: readonly ReadingWord[]): number => (first.length === 0 ? surelyThere : 0);
/** What is read where the page showed nothing must be as sure as this. */
const surelyThere = 55;

const meanConfidence = (words: readonly ReadingWord[]): number => {
  const letters = words.reduce((sum, { raw }) => sum + raw.length, 0);
  return letters === 0 ? 0 : words.reduce((sum, { raw, confidence }) => sum + confidence * raw.length, 0) / letters;
};

/** The words of a page with those of some cells replaced; new ones take the line of the old or of their neighbours. */
export function withCellsReplaced(
  words: readonly ReadingWord[],
  replaced: readonly { cell: DoubtfulCell; by: readonly ReadingWord[] }[],
): ReadingWord[] {
  const first = new Map<ReadingWord, ReadingWord[]>();
  const gone = new Set<ReadingWord>();
  const added: ReadingWord[] = [];
  for (const { cell, by } of replaced) {
    const [old] = cell.words;
    if (old === undefined) {
      const near = nearestInRow(words, zoneAround(by.map(({ box }) => box)));
      added.push(...by.map((word) => ({ ...word, line: near?.line ?? 0, block: near?.block ?? 0 })));
      continue;
    }
    for (const word of cell.words) gone.add(word);
    first.set(
      old,
      by.map((word) => ({ ...word, line: old.line, block: old.block })),
    );
  }
  return [...words.flatMap((word) => first.get(word) ?? (gone.has(word) ? [] : [word])), ...added];
}

function nearestInRow(words: readonly ReadingWord[], [x, y, , h]: Zone): ReadingWord | undefined {
  const inRow = words.filter(({ box }) => box[1] < y + h && box[1] + box[3] > y);
  return inRow.sort((a, b) => Math.abs(a.box[0] - x) - Math.abs(b.box[0] - x))[0];
}
