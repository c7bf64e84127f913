import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import { type Seen, glyphIn } from './classify.ts';
import { fractionsIn } from './fractions.ts';
import { type Look, type ReadSymbol, type SpelledWord, lineMeasure, zoneOf } from './spelled.ts';

/** At least this likely, or it is no reading. */
export const sureAbove = 0.9;

/** What may stand for a sign, and where: `before` and `behind` are what stands next to it, in the word or beside it. */
type Suspect = { signs: string; read: RegExp; before: RegExp; behind: RegExp };
const suspects: readonly Suspect[] = [
  { signs: '±', read: /^[+*£#$%&€§]$/, before: /^[("']?$|[\s(]$/, behind: /^\s?[\d.]/ },
  { signs: '±', read: /^[245tf]$/, before: /^[("']?$|[\s(]$/, behind: /^[\d.]+\s?(%|per)/ },
  {
    signs: 'µ',
    read: /^[punywmhH]$/,
    before: /\d\s?$|\d\s?[punyw]$/,
    behind: /^[punyw]?(?:[fFhHvVaAwW]|sec)?[).,;:]*$/,
  },
  { signs: 'Ω', read: /^[QO0on9aG2]$/, before: /\d\s$|\d$|\d\s?[kKM]$/, behind: /^[).,;:Q2]*$/ },
  { signs: '×', read: /^[xXK*«»]$/, before: /\d\s?$/, behind: /^\s?\d/ },
  { signs: '°', read: /^[o0O°'"*®]$/, before: /\d$/, behind: /^\s?[CFc]?[).,;:]*$/ },
];

/**
 * Looks at the letters that may be signs which the engine's model cannot write. A word whose picture says so surely gets
 * what it shows as `seen`: with the sign, or as it was read where the picture bears that out. Boxes are in the pixels
 * of `picture`, paper white. The letters are left out of what comes back.
 */
export function lookedAt(words: readonly SpelledWord[], picture: GreyPicture): ReadingWord[] {
  const byLine = new Map<number, ReadSymbol[]>();
  for (const { line, symbols } of words) byLine.set(line, [...(byLine.get(line) ?? []), ...symbols]);
  const measures = new Map([...byLine].map(([line, symbols]) => [line, lineMeasure(symbols)]));
  return words.map((word, at) => {
    const { symbols, ...plain } = word;
    const measure = measures.get(word.line);
    if (measure === null || measure === undefined || symbols.length === 0) return plain;
    const near = { before: besides(words[at - 1], word), next: besides(words[at + 1], word) };
    const look = { picture, measure };
    const seen = fractionsIn(symbols, look) ?? signsIn(symbols, near, look);
    return seen === null ? plain : { ...plain, seen };
  });
}

type Near = { before: string; next: string };

const besides = (other: SpelledWord | undefined, word: SpelledWord): string =>
  other === undefined || other.line !== word.line ? '' : other.text;

/** The word with its signs; null where no letter is in doubt, or where one of them cannot be told. */
function signsIn(symbols: readonly ReadSymbol[], near: Near, look: Look): string | null {
  const text = symbols.map((symbol) => symbol.text).join('');
  let isAnySeen = false;
  let at = 0;
  const letters = symbols.map((symbol, index) => {
    const before = at === 0 ? endOf(near.before) : text.slice(0, at);
    at += symbol.text.length;
    const behind = text.slice(at) === '' ? startOf(near.next) : text.slice(at);
    const suspect = suspects.find(
      (each) => each.read.test(symbol.text) && each.before.test(before) && each.behind.test(behind),
    );
    if (suspect === undefined) return symbol.text;
    const found = glyphIn(look.picture, zoneOf(symbols, index, look), look.measure);
    if (found === null || found.likelihood < sureAbove || !isOneOf(found, suspect, symbol)) return symbol.text;
    isAnySeen = true;
    return suspect.signs.includes(found.glyph) ? found.glyph : symbol.text;
  });
  return isAnySeen ? letters.join('') : null;
}

const endOf = (text: string): string => (text === '' ? '' : `${text} `);
const startOf = (text: string): string => (text === '' ? '' : ` ${text}`);

const isOneOf = ({ glyph }: Seen, { signs }: Suspect, { text }: ReadSymbol): boolean =>
  signs.includes(glyph) || glyph === text;
