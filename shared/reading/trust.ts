import type { ReadingWord } from './reading.ts';

/** Letters that stand on their own in print of this kind: units, short words. Others of three letters and fewer are rare. */
const shortWords = new Set(
  (
    'a an and any are as at be but by can cw dc do fig for had has hum if in is it its its key low may no nor not of off on ' +
    'one or out per pin rf run sec see set so tap ten the to too top tue two up use via was way wire with you ' +
    'ac af avc bfo db ft hp hz in kc kv kw lb ma mc meg mfd mh mmf mv mw na oz pf rms rpm sw uf uh uuf uv v w ' +
    'µa µf µh µv µs µµf ua vdc dcw cps ohm kω ω khz mhz'
  ).split(' '),
);

/** What speaks against a word besides the engine's own confidence; each is looked for in its text alone. */
const features = {
  guessed: ({ text, raw, sure }: ReadingWord): boolean => raw !== text && sure !== true,
  'figures among small letters': ({ text }: ReadingWord): boolean => /[a-z]\d|\d[a-z]+\d/.test(text),
  'strange short word': ({ text }: ReadingWord): boolean =>
    (/^[A-Za-zµ]{2,3}$/.test(bare(text)) &&
      !/^[A-Z]+$/.test(bare(text)) &&
      !shortWords.has(bare(text).toLowerCase())) ||
    capitalBehind.test(bare(text)),
  'sign the model does not print': ({ text }: ReadingWord): boolean =>
    /[^\p{Script=Latin}\d\s.,;:()[\]%+±µΩ"'’“”/*=&?½¼¾×°–—-]|[!|]\w|é/u.test(text) || signWithin.test(text),
  'nought where none begins': ({ text }: ReadingWord): boolean => /^[("']?0[\dA-Z]/.test(text),
  'bent number': ({ text }: ReadingWord): boolean =>
    /\d[:;]\d|\d[.,]{2}\d|\d,$|\d,\d{1,2}$|\d,\d{4,}|^[("']?0,\d|\d\.\d{3}\.\d/.test(text),
} as const;
type Feature = keyof typeof features;

/** A capital that only follows small letters (`tO`, `mC`); units such as mA, dB and kHz have it. */
const capitalBehind = /^(?![kmµnpd](?:A|B|F|H|Hz|V|W)$)[a-z]{1,2}[A-Z]$/;
/** A sign where a letter or a comma was printed: `german.um`, `VARIABL:,`, `WI'E`, `C1103.C1105`. Abbreviations are of single letters. */
const signWithin =
  /[A-Za-z]{2}[.:;][A-Za-z]{2}|[A-Za-z][:;.][,;:]$|[A-Z]{2}['’][A-Z]{2}|[A-Z]{2}['’][A-Z]-|\d[.:;][A-Z]+\d/;

const bare = (text: string): string => text.replace(/^[("'“‘]+|[)"'”’.,;:]+$/g, '');

export const featureNames = Object.keys(features) as Feature[];
export const featuresOf = (word: ReadingWord): boolean[] => featureNames.map((name) => features[name](word));

/**
 * `odds`: what the log-odds of the engine's confidence weigh in those of a word being right; and what each feature adds.
 * Fitted by logistic regression (`tsx tests/bench/fit-trust.ts FOLDER ...`) on 15,489 words of 44 generated pages, 216 of
 * them wrong: seeds 1 and 5 of good quality, seed 6 bad, in black and white, and turned. Kinds of slips found later, on
 * seeds 101 to 105, weigh what their like weigh.
 */
const fitted: { odds: number } & Record<Feature, number> = {
  odds: 0.99,
  guessed: -0.25,
  'figures among small letters': -3.19,
  'strange short word': -3.46,
  'sign the model does not print': -3.71,
  'nought where none begins': -1.56,
  'bent number': -2.95,
};

/** Log-odds of the engine's confidence, which never means that it cannot err. */
export const oddsOf = (confidence: number): number => {
  const share = Math.min(0.985, Math.max(0.015, confidence / 100));
  return Math.log(share / (1 - share));
};

/**
 * How far a word is to be trusted, 0 to 100, on the engine's own scale: its confidence, less what the looks of the word
 * say against it. A word that looks as print does keeps its confidence.
 */
export function trustIn(word: ReadingWord): number {
  const given = featuresOf(word).reduce(
    (sum, has, index) => sum + (has ? fitted[featureNames[index] ?? 'guessed'] : 0),
    0,
  );
  if (given === 0) return word.confidence;
  return Math.min(word.confidence, 100 / (1 + Math.exp(-(oddsOf(word.confidence) + given / fitted.odds))));
}
