import { median, middleOf } from './lines.ts';
import type { ReadingWord } from './reading.ts';

/** Below this confidence one or two letters on their own are more likely a speck than print. */
const speckBelow = 45;
const signsOnly = /^[^\p{L}\p{N}]+$/u;
/** The marker of a step, with its letter c read as a sign. */
const bentMarker = /^\(?[¢©][.,)]$/;
/** Signs that print does set on their own. */
const plainSigns = /^([–—&=+±%#*"”.]|\.{2,})$/u;

/**
 * Leaves out what dirt, punch holes and the stubs of rules were read as. The reading keeps them; the document does not,
 * for a speck that reads as a letter sends lines and rows astray. What stands in a row with other words is kept, however
 * doubtful: it may be a designator.
 */
export function withoutSpecks(words: readonly ReadingWord[]): ReadingWord[] {
  const letter = median(words.filter(({ text }) => text.length > 2).map(({ box }) => box[3]));
  const solid = words.filter(({ text, confidence }) => text.length > 2 && confidence >= speckBelow);
  const isAlone = ({ box }: ReadingWord): boolean =>
    !solid.some((other) => Math.abs(middleOf(other.box) - middleOf(box)) < letter * 0.7);
  return words.filter(
    (word) => !isSpeck(word, letter) && !(word.text.length <= 2 && word.confidence < 80 && isAlone(word)),
  );
}

function isSpeck({ text, confidence, box: [, , width, height] }: ReadingWord, letter: number): boolean {
  if (bentMarker.test(text) || text === '•') return false;
  if (signsOnly.test(text)) return confidence < 85 || !plainSigns.test(text);
  const isOddSize = height < letter * 0.45 || height > letter * 2.2 || (text.length > 2 && width < letter * 0.3);
  return isOddSize && confidence < 70;
}
