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
  const rim = rimOf(words, letter);
  return words.filter(
    (word) =>
      !rim.has(word) && !isSpeck(word, letter) && !(word.text.length <= 2 && word.confidence < 80 && isAlone(word)),
  );
}

/** Words that surely are words mark where the print ends; so many letter heights beyond them begins the rim. */
const surelyWord = 60;
const rimLetters = 0.8;

/**
 * The shadow along the edge of the sheet is read as a column of single letters. They are told from markers and counts, which
 * also stand beside all other print, by how little the engine trusts them as a whole.
 */
function rimOf(words: readonly ReadingWord[], letter: number): Set<ReadingWord> {
  const sure = words.filter(({ text, confidence }) => text.length > 2 && confidence >= surelyWord);
  if (sure.length === 0) return new Set();
  const left = Math.min(...sure.map(({ box }) => box[0])) - letter * rimLetters;
  const right = Math.max(...sure.map(({ box }) => box[0] + box[2])) + letter * rimLetters;
  const short = words.filter(({ text }) => text.length <= 2);
  const sides = [short.filter(({ box }) => box[0] + box[2] < left), short.filter(({ box }) => box[0] > right)];
  return new Set(sides.filter((side) => median(side.map(({ confidence }) => confidence)) < speckBelow).flat());
}

function isSpeck({ text, confidence, box: [, , width, height] }: ReadingWord, letter: number): boolean {
  if (bentMarker.test(text) || text === '•') return false;
  if (signsOnly.test(text)) return confidence < 85 || !plainSigns.test(text);
  const isOddSize = height < letter * 0.45 || height > letter * 2.2 || (text.length > 2 && width < letter * 0.3);
  return isOddSize && confidence < 70;
}
