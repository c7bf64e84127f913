import { symbolObjection } from '#shared/expressions/names.ts';

const emptyWords = new Set([
  'the',
  'a',
  'an',
  'of',
  'to',
  'at',
  'is',
  'are',
  'and',
  'or',
  'for',
  'on',
  'in',
  'with',
  'be',
  'by',
  'it',
  'from',
  'now',
  'about',
]);
const wordsOfLabel = 3;

/** A label and a symbol from the words ahead of the number: "The first i-f is" gives `firstIF`. Only a proposal. */
export function proposeName(before: string, taken: readonly string[]): { label: string; symbol: string } {
  const words = (before.split(/[.;:]/).at(-1) ?? '').match(/[A-Za-z][A-Za-z0-9-]*/g) ?? [];
  const telling = words.filter((word) => !emptyWords.has(word.toLowerCase())).slice(-wordsOfLabel);
  const label = telling.join(' ');
  return {
    label: label === '' ? '' : label.charAt(0).toUpperCase() + label.slice(1),
    symbol: freeSymbol(telling, taken),
  };
}

function freeSymbol(words: readonly string[], taken: readonly string[]): string {
  const plain = words.map((word) => word.replaceAll('-', ''));
  const joined = plain
    .map((word, at) => (at === 0 ? word.toLowerCase() : word.charAt(0).toUpperCase() + word.slice(1).toLowerCase()))
    .join('');
  const base = joined === '' ? 'value' : joined.slice(0, 40);
  for (let count = 1; ; count += 1) {
    const symbol = count === 1 ? base : `${base}${count}`;
    if (!taken.includes(symbol) && symbolObjection(symbol) === undefined) return symbol;
  }
}
