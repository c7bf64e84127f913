import { type Zone, zoneAround } from '#shared/document/define-block.ts';
import { type Line, bottomOf, median, middleOf, rightOf, rowsByHeight, segmentsOf } from './lines.ts';
import type { ReadingWord } from './reading.ts';
import { joinWrapped } from './wrapped-rows.ts';

/** A row of a table found on the page: for each column its words, none for an empty cell. */
export type FoundRow = { cells: ReadingWord[][]; zone: Zone };
export type FoundTable = { zone: Zone; columns: { left: number; right: number }[]; rows: FoundRow[] };

// The measures below are in letter heights and come from trials on generated scans of ruled and unruled parts lists.
const cellGapLetters = 1.15;
const cellGapWordGaps = 1.7;
const leastRows = 3;
const leastSegments = 3;
/** Rows in a table that do not fall apart: a section heading, the second line of a description. */
const mostPlainRows = 3;
const valleyCoverShare = 0.045;
const valleyLetters = 0.8;
const columnSupportShare = 0.12;
const leastFilledShare = 0.7;
const raggedBelowShare = 0.5;
const raggedGoingOn = 0.6;

/** Finds tables by their words alone: runs of lines that fall into three or more parts, with bands of paper between. */
export function findTables(words: readonly ReadingWord[]): FoundTable[] {
  const solid = words.filter(({ text }) => !isRuleOrLeader(text));
  if (solid.length === 0) return [];
  const rows = rowsByHeight(solid);
  const letter = median(solid.map(({ box }) => box[3]));
  const gap = Math.max(cellGapLetters * letter, cellGapWordGaps * usualWordGap(rows, letter));
  return regionsOf(rows, gap, letter).flatMap((region) => tableFrom(region, gap, letter) ?? []);
}

/** What is left of rules and dot leaders: no letters or digits, and nothing that a cell could mean. */
const isRuleOrLeader = (text: string): boolean =>
  /^[|[\](){}_.,:;'"~=\-–—•·]{1,}$/u.test(text) && !/^["”]$/u.test(text);

/** A gap wider than this, in letter heights, lies between cells and says nothing about words. */
const widestWordGapLetters = 1.6;
/** For a page that is all cells of one word. */
const commonWordGapLetters = 0.7;

function usualWordGap(rows: readonly Line[], letter: number): number {
  const gaps = rows.flatMap(({ words }) =>
    words.slice(1).map((word, index) => word.box[0] - rightOf(words[index]?.box ?? word.box)),
  );
  const narrow = gaps.filter((gap) => gap > 0 && gap < widestWordGapLetters * letter);
  return narrow.length < rows.length / 4 ? commonWordGapLetters * letter : median(narrow);
}

/** Runs of rows in which most fall into three or more parts; a few plain rows between are let pass. */
function regionsOf(rows: readonly Line[], gap: number, letter: number): Line[][] {
  const regions: Line[][] = [];
  let open: Line[] = [];
  let sinceParted = 0;
  const close = (): void => {
    const end = open.length - sinceParted;
    const kept = open.slice(0, end + (goesOn(open[end - 1], open[end], { gap, letter }) ? 1 : 0));
    if (kept.filter((row) => segmentsOf(row, gap).length >= leastSegments).length >= leastRows) regions.push(kept);
    [open, sinceParted] = [[], 0];
  };
  for (const row of rows) {
    const isParted = segmentsOf(row, gap).length >= leastSegments;
    const last = open.at(-1);
    const isFar = last !== undefined && row.zone[1] - bottomOf(last.zone) > letter * 4;
    if (isFar || (!isParted && sinceParted >= mostPlainRows)) close();
    if (!isParted && open.length === 0) continue;
    open.push(row);
    sinceParted = isParted ? 0 : sinceParted + 1;
  }
  close();
  return regions;
}

/** Whether the row behind the last one with cells is the end of its wrapped description: close, and not at the margin. */
function goesOn(
  last: Line | undefined,
  next: Line | undefined,
  { gap, letter }: { gap: number; letter: number },
): boolean {
  if (last === undefined || next === undefined) return false;
  const second = segmentsOf(last, gap)[1]?.[0];
  const isClose = middleOf(next.zone) - bottomOf(last.zone) < letter * 1.6;
  return second !== undefined && isClose && next.zone[0] >= second.box[0] - letter;
}

function tableFrom(region: Line[], gap: number, letter: number): FoundTable | undefined {
  const zone = zoneAround(region.map((row) => row.zone));
  const parted = region.filter((row) => segmentsOf(row, gap).length >= leastSegments);
  const valleys = valleysOf(parted, zone, letter);
  const columns = mergeRagged(mergeWeak(columnsBetween(valleys, zone), parted), parted, gap);
  if (columns.length < 2) return undefined;
  const rows = region.map((row) => ({ cells: cellsOf(row, columns), zone: row.zone }));
  return { zone, columns, rows: joinWrapped(rows, columns, letter) };
}

/** Bands of paper that run down through (nearly) all rows. */
function valleysOf(rows: readonly Line[], [left, , width]: Zone, letter: number): { start: number; end: number }[] {
  const cover = new Uint16Array(Math.ceil(width) + 1);
  for (const { words } of rows) {
    const own = new Set<number>();
    for (const { box } of words)
      for (let x = Math.floor(box[0] - left); x <= Math.ceil(rightOf(box) - left); x += 1) own.add(x);
    for (const x of own) if (x >= 0 && x < cover.length) cover[x] = (cover[x] ?? 0) + 1;
  }
  const most = Math.floor(rows.length * valleyCoverShare);
  const valleys: { start: number; end: number }[] = [];
  let start = -1;
  cover.forEach((count, x) => {
    if (count <= most && start < 0) start = x;
    if ((count > most || x === cover.length - 1) && start >= 0) {
      if (x - start >= valleyLetters * letter) valleys.push({ start: start + left, end: x + left });
      start = -1;
    }
  });
  return valleys.filter((valley) => valley.start > left && valley.end < left + width - 1);
}

function columnsBetween(valleys: { start: number; end: number }[], [left, , width]: Zone): FoundTable['columns'] {
  const edges = [left, ...valleys.map(({ start, end }) => (start + end) / 2), left + width];
  return edges.slice(0, -1).map((edge, index) => ({ left: edge, right: edges[index + 1] ?? edge }));
}

/** A column that few rows use is the ragged end of the one before it. */
function mergeWeak(columns: FoundTable['columns'], rows: readonly Line[]): FoundTable['columns'] {
  return columns.reduce<FoundTable['columns']>((kept, column) => {
    const support = rows.filter(({ words }) =>
      words.some(({ box }) => box[0] >= column.left && box[0] < column.right),
    ).length;
    const before = kept.at(-1);
    if (before !== undefined && support < rows.length * columnSupportShare) {
      return [...kept.slice(0, -1), { left: before.left, right: column.right }];
    }
    return [...kept, column];
  }, []);
}

/** Most rows that use a column merely go on into it from the one before: a ragged end, such as "v dcw", and no column. */
function mergeRagged(columns: FoundTable['columns'], rows: readonly Line[], gap: number): FoundTable['columns'] {
  return columns.reduce<FoundTable['columns']>((kept, column) => {
    const before = kept.at(-1);
    if (before === undefined) return [column];
    const steps = rows.flatMap(({ words }) => {
      const at = words.findIndex(({ box }) => isWithin(box, column));
      const [last, first] = [words[at - 1], words[at]];
      if (first === undefined) return [];
      return [last === undefined || last.box[0] < before.left ? Infinity : first.box[0] - rightOf(last.box)];
    });
    const goingOn = steps.filter((step) => step <= gap).length;
    if (steps.length < rows.length * raggedBelowShare && goingOn >= steps.length * raggedGoingOn)
      return [...kept.slice(0, -1), { left: before.left, right: column.right }];
    return [...kept, column];
  }, []);
}

const isWithin = ([x, , w]: Zone, { left, right }: { left: number; right: number }): boolean =>
  x + w / 2 >= left && x + w / 2 < right;

const cellsOf = ({ words }: Line, columns: FoundTable['columns']): ReadingWord[][] =>
  columns.map(({ left, right }, index) =>
    words.filter(({ box }) => {
      const middle = box[0] + box[2] / 2;
      return (middle >= left || index === 0) && (middle < right || index === columns.length - 1);
    }),
  );

/** Labels of a drawing can line up like a table, but leave many of its cells empty; a printed table seldom does. */
export function isWellFilled({ rows }: FoundTable): boolean {
  const cells = rows
    .filter((row) => row.cells.filter((cell) => cell.length > 0).length > 1)
    .flatMap((row) => row.cells);
  return cells.filter((cell) => cell.length > 0).length >= cells.length * leastFilledShare;
}
