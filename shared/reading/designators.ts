import type { Mended } from './mended.ts';

/** Class letters of reference designators, after ASA Y32.16-1965 and the lists before it. */
export const designatorLetters = new Set(
  'A AR AT B BT C CB CP CR D DC DL DS E F FL G H HR HY I J K L LS M MK MP MT N NE P PL PS Q R RE RT RV RY S SO SQ T TB TC TP TR TS U V VR VT W X XF XL XQ XV XY Y Z'.split(
    ' ',
  ),
);

/** Figures that worn type and small print make into letters, the likeliest first. */
const figuresFor: Record<string, string> = {
  l: '1',
  I: '1',
  i: '1',
  '!': '1',
  '|': '1',
  t: '17',
  J: '1',
  O: '0',
  o: '09',
  S: '58',
  s: '58',
  B: '8',
  Z: '2',
  z: '2',
  e: '68',
  a: '4',
  g: '9',
  q: '9',
  b: '6',
  G: '6',
  A: '4',
};
const letterFor: Record<string, string> = { '€': 'C', '¢': 'C', '©': 'C', $: 'S', '§': 'S' };

const wellFormed = /^([A-Z]{1,2})([1-9]\d{0,3})([A-Z]?)$/;

export const isDesignator = (text: string): boolean => designatorLetters.has(wellFormed.exec(text)?.[1] ?? '');

const inText = /^([("']*)([A-Za-z€¢$]{1,2}[1-9]\d{1,3})([).,;:]*)$/;

/** In running text only what leaves no choice is mended: small letters before three or four figures, a letter read twice. */
export function mendDesignator(text: string): Mended | null {
  const [, open = '', name = '', close = ''] = inText.exec(text) ?? [];
  const mended = withoutDouble(name) ?? inCapitals(name);
  return mended === null ? null : { text: open + mended + close, sure: false };
}

/** "Vv1141": the letter was read large and small. */
function withoutDouble(name: string): string | null {
  const [, large, small, figures] = /^([A-Z])([a-z])(\d+)$/.exec(name) ?? [];
  return large !== undefined && figures !== undefined && large === small?.toUpperCase() ? large + figures : null;
}

function inCapitals(name: string): string | null {
  const [, letters = '', figures = ''] = /^([a-z€¢$]{1,2})(\d{3,4})$/.exec(name) ?? [];
  const upper = upperLetters(letters);
  return designatorLetters.has(upper) ? upper + figures : null;
}

const upperLetters = (letters: string): string =>
  [...letters].map((each) => letterFor[each] ?? each.toUpperCase()).join('');

/** What a word in a column of designators may have been, the likeliest first; itself where it is well formed. */
export function designatorsLike(read: string): string[] {
  const word = read.replace(/^["'‘“.,:;~(|-]+|["'’”.:;~|]+$/g, '');
  if (isDesignator(word)) return [word];
  // "Cc11" and "CRi1101": a letter or a figure was read twice, once small.
  const tries = [word, word.replace(/^([A-Z€¢])[a-z](?=\d)/, '$1'), word.replace(/[il](?=1)/, '')];
  const found = tries.flatMap((each) => [1, 2].flatMap((split) => readAs(each, split)));
  return [...new Set(found)].filter(isDesignator);
}

const mostCandidates = 16;

function readAs(word: string, split: number): string[] {
  const letters = upperLetters(word.slice(0, split)).replace(/^[0O]$/, 'Q');
  const figures = [...word.slice(split)].map((each) => [...(figuresFor[each] ?? each)]);
  const all = figures.reduce<string[]>(
    (starts, choices) => starts.flatMap((start) => choices.map((each) => start + each)),
    [letters],
  );
  return all.slice(0, mostCandidates);
}
