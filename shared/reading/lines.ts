import { type Zone, zoneAround } from '#shared/document/define-block.ts';
import type { ReadingWord } from './reading.ts';

/** A line of print: its words from left to right. */
export type Line = { words: ReadingWord[]; zone: Zone; block: number };

export const bottomOf = ([, y, , h]: Zone): number => y + h;
export const rightOf = ([x, , w]: Zone): number => x + w;
export const middleOf = ([, y, , h]: Zone): number => y + h / 2;

/** The middle of a list of numbers, the lower of two; 0 for an empty list. */
export function median(numbers: readonly number[]): number {
  const sorted = [...numbers].sort((a, b) => a - b);
  return sorted[Math.floor((sorted.length - 1) / 2)] ?? 0;
}

/** Groups words by the engine's own lines, which follow the reading order it found. */
export function linesOf(words: readonly ReadingWord[]): Line[] {
  const byLine = new Map<number, ReadingWord[]>();
  for (const word of words) byLine.set(word.line, [...(byLine.get(word.line) ?? []), word]);
  return [...byLine.values()].map((own) => lineFrom(own));
}

export function lineFrom(words: ReadingWord[]): Line {
  const sorted = [...words].sort((a, b) => a.box[0] - b.box[0]);
  return { words: sorted, zone: zoneAround(sorted.map(({ box }) => box)), block: sorted[0]?.block ?? 0 };
}

/**
 * Groups words by height alone, whatever blocks the engine saw: the rows of a table that it took for columns. Words
 * belong to a line when their middles are within half a letter of each other.
 */
export function rowsByHeight(words: readonly ReadingWord[]): Line[] {
  const letter = median(words.map(({ box }) => box[3]));
  const rows: { middle: number; words: ReadingWord[] }[] = [];
  for (const word of [...words].sort((a, b) => middleOf(a.box) - middleOf(b.box))) {
    const row = rows.at(-1);
    if (row !== undefined && middleOf(word.box) - row.middle < letter * 0.5) {
      row.words.push(word);
      row.middle += (middleOf(word.box) - row.middle) / row.words.length;
    } else rows.push({ middle: middleOf(word.box), words: [word] });
  }
  return rows.map(({ words: own }) => lineFrom(own));
}

export const lineText = ({ words }: Line): string => words.map(({ text }) => text).join(' ');

/** Splits a line where the gaps are much wider than between words: the cells of a table's row. */
export function segmentsOf(line: Line, widestWordGap: number): ReadingWord[][] {
  const segments: ReadingWord[][] = [];
  for (const word of line.words) {
    const segment = segments.at(-1);
    const before = segment?.at(-1);
    if (segment !== undefined && before !== undefined && word.box[0] - rightOf(before.box) <= widestWordGap)
      segment.push(word);
    else segments.push([word]);
  }
  return segments;
}
