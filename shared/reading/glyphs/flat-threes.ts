import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { firstOf } from './classify.ts';
import type { LineMeasure } from './patch.ts';
import { type SpelledWord, zoneOf } from './spelled.ts';

const numeral = /^[_$("']*\d[\d.,_]*[%).,;]*$/;
const surelyThree = 0.8;
/** So many of the figures read as 5, and this share of them, must look like a 3 before the page is taken to have such threes. */
const fewest = 5;
const leastShare = 0.2;

/**
 * Many a typewriter has a 3 with a flat top, which the engine takes for a 5. Where a good part of the fives of a page look
 * like that, each is told by its picture: gives the words that change, with what they show.
 */
export function flatThrees(
  words: readonly SpelledWord[],
  measures: ReadonlyMap<number, LineMeasure | null>,
  picture: GreyPicture,
): Map<SpelledWord, string> {
  const fives = words.flatMap((word) => {
    const measure = measures.get(word.line);
    if (measure === null || measure === undefined || !numeral.test(word.text)) return [];
    return word.symbols.flatMap(({ text }, at) => {
      if (text !== '5') return [];
      const three = firstOf(['3', '5'], picture, zoneOf(word.symbols, at, { picture, measure }), measure);
      return [{ word, at, isThree: three !== null && three >= surelyThree }];
    });
  });
  const threes = fives.filter(({ isThree }) => isThree);
  const seen = new Map<SpelledWord, string>();
  if (threes.length < fewest || threes.length < fives.length * leastShare) return seen;
  for (const { word } of threes) {
    const own = threes.filter((each) => each.word === word).map(({ at }) => at);
    seen.set(word, word.symbols.map(({ text }, at) => (own.includes(at) ? '3' : text)).join(''));
  }
  return seen;
}
