import type { Zone } from '#shared/document/define-block.ts';
import { median } from '#shared/reading/lines.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import type { LineMeasure } from './patch.ts';

/** A letter as the engine read it, with its box in the picture that was read. */
export type ReadSymbol = { text: string; box: Zone };

/** A word as the engine gives it, letter by letter. */
export type SpelledWord = ReadingWord & { symbols: ReadSymbol[] };

/** The picture that words were read from, and where the line of one of them stands in it. */
export type Look = { picture: GreyPicture; measure: LineMeasure };

const standsOnLine = /^[A-PR-Za-fhik-or-xz0-9]$/;
const isTall = /^[A-PR-Zbdfhkl0-9]$/;
const fewestLetters = 3;

/** Where a line of symbols stands, from its letters; null where it has too few to tell. */
export function lineMeasure(symbols: readonly ReadSymbol[]): LineMeasure | null {
  const feet = symbols.filter(({ text }) => standsOnLine.test(text)).map(({ box }) => box[1] + box[3]);
  const heights = symbols.filter(({ text }) => isTall.test(text)).map(({ box }) => box[3]);
  if (feet.length < fewestLetters || heights.length < fewestLetters) return null;
  return { baseline: median(feet), capital: median(heights) };
}

/** From the letter before to the letter behind, for the engine's boxes are a little narrow; high and low enough for any sign. */
export function zoneOf(symbols: readonly ReadSymbol[], at: number, { measure: { baseline, capital } }: Look): Zone {
  const own = symbols[at]?.box ?? [0, 0, 0, 0];
  const before = symbols[at - 1]?.box;
  const left = Math.max(own[0] - 2, before === undefined ? 0 : Math.min(own[0], before[0] + before[2] + 1));
  const behind = symbols[at + 1]?.box;
  const right = Math.min(
    own[0] + own[2] + 2,
    behind === undefined ? Infinity : Math.max(own[0] + own[2], behind[0] - 1),
  );
  const [top, bottom] = [Math.round(baseline - capital * 1.3), Math.round(baseline + capital * 0.42)];
  return [left, top, right - left, bottom - top];
}
