import type { Zone } from '#shared/document/define-block.ts';
import { findTables } from './find-tables.ts';
import { type Line, bottomOf, lineFrom, median, middleOf, rightOf, rowsByHeight } from './lines.ts';
import { overlap } from './picture/figures.ts';
import type { ReadingWord } from './reading.ts';

// In letter heights, except where said; from a two-column brochure and generated pages of two columns.
const narrowestGutter = 1.2;
/** The gutter stands in the middle third or so of the text's width. */
const gutterFrom = 0.3;
const gutterTo = 0.7;
/** Fewer rows with text on both sides, or shorter text on them, are no columns of running text. */
const fewestRows = 4;
const fewestWords = 3;
const leastFilled = 0.6;
/** In pitches of the lines: what stands on one side only, further away than this, is no longer part of the columns. */
const apart = 1.6;

type Span = { from: number; to: number };
/** Rows `first` to `last`, both included, set in two columns on either side of `gutter`. */
type Columns = { first: number; last: number; gutter: number };

/**
 * The words of a page in reading order: where lines of running text stand side by side, the whole left column comes
 * before the right one, though the engine read straight across. Lines elsewhere, tables and drawings stay as they were.
 */
export function inReadingOrder(words: readonly ReadingWord[], figures: readonly Zone[]): ReadingWord[] {
  const taken = [...findTables(words).map(({ zone }) => zone), ...figures];
  const free = words.filter(({ box }) => !taken.some((zone) => overlap(box, zone) > 0.5));
  const rows = rowsByHeight(free);
  const found = columnsIn(rows, taken);
  return found.reduce<ReadingWord[]>((ordered, columns) => withColumns(ordered, rows, columns), [...words]);
}

function columnsIn(rows: readonly Line[], taken: readonly Zone[]): Columns[] {
  const letter = median(rows.flatMap(({ words }) => words.map(({ box }) => box[3])));
  const pitch = median(rows.slice(1).map((row, at) => middleOf(row.zone) - middleOf(rows[at]?.zone ?? row.zone)));
  const found: Columns[] = [];
  for (let first = 0; first < rows.length; first += 1) {
    const run = runFrom(rows, first, { letter, taken });
    const columns = run === null ? null : trimmed(rows, run, pitch);
    if (columns === null || !isRunningText(rows, columns)) continue;
    found.push(columns);
    first = columns.last;
  }
  return found;
}

/** As many rows from `first` on as leave one band of paper near the middle free, but for specks read as signs. */
function runFrom(
  rows: readonly Line[],
  first: number,
  { letter, taken }: { letter: number; taken: readonly Zone[] },
): Columns | null {
  const left = Math.min(...rows.map(({ zone }) => zone[0]));
  const width = Math.max(...rows.map(({ zone }) => rightOf(zone))) - left;
  let free: Span[] = [{ from: left + width * gutterFrom, to: left + width * gutterTo }];
  let last = first - 1;
  for (const row of rows.slice(first)) {
    const above = rows[last]?.zone;
    const isBarred = last >= first && above !== undefined && taken.some((zone) => liesBetween(zone, above, row.zone));
    const narrowed = row.words
      .filter(({ text }) => /[\p{L}\p{N}]/u.test(text))
      .reduce((spans, { box }) => spans.flatMap((span) => without(span, box)), free)
      .filter(({ from, to }) => to - from >= narrowestGutter * letter);
    if (narrowed.length === 0 || isBarred) break;
    free = narrowed;
    last += 1;
  }
  const widest = [...free].sort((a, b) => b.to - b.from - (a.to - a.from))[0];
  return last < first + fewestRows - 1 || widest === undefined
    ? null
    : { first, last, gutter: (widest.from + widest.to) / 2 };
}

const liesBetween = (zone: Zone, above: Zone, below: Zone): boolean =>
  middleOf(zone) > middleOf(above) && middleOf(zone) < middleOf(below);

function without({ from, to }: Span, [x, , w]: Zone): Span[] {
  const rest = [
    { from, to: Math.min(to, x) },
    { from: Math.max(from, x + w), to },
  ];
  return rest.filter((span) => span.to > span.from);
}

const sidesOf = ({ words }: Line, gutter: number): [ReadingWord[], ReadingWord[]] => [
  words.filter(({ box }) => box[0] < gutter),
  words.filter(({ box }) => box[0] >= gutter),
];

/** Without the rows at either end that have text on one side only and stand apart from the columns. */
function trimmed(rows: readonly Line[], { first, last, gutter }: Columns, pitch: number): Columns | null {
  const inRun = rows.slice(first, last + 1).map((row) => sidesOf(row, gutter));
  const both = inRun.flatMap(([left, right], at) => (left.length > 0 && right.length > 0 ? [first + at] : []));
  const [top, end] = [both[0], both.at(-1)];
  if (top === undefined || end === undefined) return null;
  const isNear = (a: number, b: number): boolean => {
    const [upper, lower] = [rows[a]?.zone, rows[b]?.zone];
    return upper !== undefined && lower !== undefined && lower[1] - bottomOf(upper) < (apart - 0.7) * pitch;
  };
  let to = end;
  while (to < last && isNear(to, to + 1)) to += 1;
  return { first: top, last: to, gutter };
}

/** Text that fills its column on both sides, line after line: two short columns of words are a list. */
function isRunningText(rows: readonly Line[], { first, last, gutter }: Columns): boolean {
  const sides = rows.slice(first, last + 1).map((row) => sidesOf(row, gutter));
  const both = sides.filter(([left, right]) => left.length > 0 && right.length > 0);
  return both.length >= fewestRows && [0, 1].every((side) => isFilled(both.map((each) => each[side] ?? [])));
}

function isFilled(pieces: readonly ReadingWord[][]): boolean {
  const lines = pieces.map((piece) => lineFrom(piece));
  const left = Math.min(...lines.map(({ zone }) => zone[0]));
  const width = Math.max(...lines.map(({ zone }) => rightOf(zone))) - left;
  return (
    median(lines.map(({ words }) => words.length)) >= fewestWords &&
    median(lines.map(({ zone }) => zone[2])) >= width * leastFilled
  );
}

/** The words with those of the two columns put in order, at the place of the first of them, each side's rows as lines. */
function withColumns(
  words: readonly ReadingWord[],
  rows: readonly Line[],
  { first, last, gutter }: Columns,
): ReadingWord[] {
  const own = new Set(rows.slice(first, last + 1).flatMap((row) => row.words));
  let line = Math.max(...words.map((word) => word.line));
  const ordered = [0, 1].flatMap((side) => {
    const column = words.filter((word) => own.has(word) && (word.box[0] < gutter ? 0 : 1) === side);
    return rowsByHeight(column).flatMap((row) => {
      line += 1;
      return row.words.map((word) => ({ ...word, line, block: (word.block + 1) * sidesApart + side }));
    });
  });
  const at = words.findIndex((word) => own.has(word));
  const before = words.slice(0, at);
  return [...before, ...ordered, ...words.slice(at).filter((word) => !own.has(word))];
}

/** Blocks are numbered anew, so that no side shares one with the other or with what stands elsewhere. */
const sidesApart = 1000;
