import type { ReadingWord } from './reading.ts';

/** What a word was made into; `sure` when the grammar leaves no other reading, so that it is no doubt. */
export type Mended = { text: string; sure: boolean };

/** What the whole page tells about the signs that it prints. */
export type PageHabit = {
  printsMicro: boolean;
  printsTolerances: boolean;
  printsPeriodUnits: boolean;
  /** A space stands between figures and units. */
  partsUnits: boolean;
};

/** The words on either side; the one before is mended already. */
export type Near = { before: ReadingWord | undefined; next: ReadingWord | undefined };

/** A word with what it was made into; what was a guess once stays one. */
export function applied(word: ReadingWord, mended: Mended | null): ReadingWord {
  if (mended === null || mended.text === word.text) return word;
  const sure = mended.sure && (word.text === word.raw || word.sure === true);
  return { ...word, text: mended.text, sure };
}
