import { applied } from './mended.ts';
import { linesOf, median } from './lines.ts';
import type { ReadingWord } from './reading.ts';

/** What a bullet is read as, alone in front of its line: the English model has one, but seldom takes it. */
const bent = /^[•®¢©*°·»«¥§eo@+.,-]$/;
/** Fewer lines than this with such a sign in front, one below the other, may be chance. */
const fewestBullets = 3;
/** In letter heights: how far apart their left edges may be, and how large a disc may be, both ways. */
const alignedLetters = 0.4;
const widestLetters = 1.05;

/** Bullets in front of the lines of a list, put back where signs stand one below the other; `raw` keeps what was read. */
export function mendBullets(words: readonly ReadingWord[]): ReadingWord[] {
  const letter = median(words.map(({ box }) => box[3]));
  const leads = linesOf(words).flatMap(({ words: [first, second] }) => {
    const isSmall = first !== undefined && Math.max(first.box[2], first.box[3]) < letter * widestLetters;
    return isSmall && second !== undefined && bent.test(first.text) ? [first] : [];
  });
  const isAligned = (word: ReadingWord): boolean =>
    leads.filter(({ box }) => Math.abs(box[0] - word.box[0]) < letter * alignedLetters).length >= fewestBullets;
  const bullets = new Set(leads.filter(isAligned));
  return words.map((word) => (bullets.has(word) ? applied(word, { text: '•', sure: true }) : word));
}
