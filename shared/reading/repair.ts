import type { ReadingWord } from './reading.ts';

/**
 * The English model cannot write ±: it comes out as one of these. Ahead of a number with a percent sign none of them
 * can have been printed as such, so the sign is put back, and the word is a doubt because it was worked out, not read.
 */
const bentPlusMinus = /^[+*£#](?=\.?\d[\d.,]*\s*%?$)/;
/** `c` of kc and mc read as e, behind a number. In trials this was the commonest slip in units, 1 word in 20. */
const bentUnits: Record<string, string> = {
  ke: 'kc',
  me: 'mc',
  'ke.': 'kc.',
  'me.': 'mc.',
  'ke,': 'kc,',
  'me,': 'mc,',
};

const isNumber = (word: ReadingWord | undefined): boolean =>
  word !== undefined && /^[±+-]?\.?\d[\d.,]*$/.test(word.text);
const isPercent = (word: ReadingWord | undefined): boolean => word !== undefined && /^(%|percent|per)/i.test(word.text);

/** Mends what cannot have been printed, by the grammar of units; `raw` keeps what the engine wrote. */
export const repairWords = (words: readonly ReadingWord[]): ReadingWord[] =>
  words.map((word, index) => {
    const text = mended(word.text, words[index - 1], words[index + 1]);
    return text === word.text ? word : { ...word, text };
  });

function mended(text: string, before: ReadingWord | undefined, next: ReadingWord | undefined): string {
  const unit = bentUnits[text];
  if (unit !== undefined && isNumber(before)) return unit;
  const isTolerance = text.endsWith('%') || isPercent(next);
  return isTolerance ? text.replace(bentPlusMinus, '±') : text;
}
