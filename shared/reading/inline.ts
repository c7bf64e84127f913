import type { DocNode, Mark } from '#shared/document/define-block.ts';
import type { DoubtMark } from '#shared/document/marks.ts';
import type { ReadingWord } from './reading.ts';
import { trustIn } from './trust.ts';

/** Below this confidence a word is shown as a doubt: in trials nine in ten wrong words lay under it. */
export const doubtBelow = 75;

const markOf = (word: ReadingWord): Mark[] => {
  const place: Mark = { type: 'word', attrs: { zone: word.box, confidence: Math.round(trustIn(word)) } };
  const reason = doubtReason(word);
  if (reason === null) return [place];
  const doubt: DoubtMark = { reason, proposals: word.raw === word.text ? [] : [word.raw] };
  return [place, { type: 'doubt', attrs: doubt }];
};

/** A number that the page's other figures made into another one. */
const isNumberSeen = ({ seen, text }: ReadingWord): boolean => seen === text && /^[\d.,$%()-]+$/.test(text);

function doubtReason(word: ReadingWord): DoubtMark['reason'] | null {
  if (word.raw !== word.text && word.sure !== true) return isNumberSeen(word) ? 'looks-otherwise' : 'sign-guessed';
  if (trustIn(word) < doubtBelow) return 'low-confidence';
  return /\d[:;]\d|\d[.,]{2}\d|\d,\d{1,2}$|\d,\d{4,}/.test(word.text) ? 'odd-number' : null;
}

/** Words as text nodes, each tied to its place on the scan, with plain spaces between them. */
export function inlineOf(words: readonly ReadingWord[]): DocNode[] {
  const nodes: DocNode[] = [];
  words.forEach((word, index) => {
    if (word.text === '') return;
    if (nodes.length > 0 && !isBroken(words[index - 1], word)) nodes.push({ type: 'text', text: ' ' });
    nodes.push({ type: 'text', text: brokenAt(word, words[index + 1]), marks: markOf(word) });
  });
  return nodes;
}

/** A hyphen at the end of a line is the printer's, not the word's, when the next line goes on in small letters. */
const isBroken = (word: ReadingWord | undefined, next: ReadingWord | undefined): boolean =>
  word !== undefined &&
  next !== undefined &&
  word.line !== next.line &&
  /[a-z]-$/.test(word.text) &&
  /^[a-z]/.test(next.text);

const brokenAt = (word: ReadingWord, next: ReadingWord | undefined): string =>
  isBroken(word, next) ? word.text.slice(0, -1) : word.text;
