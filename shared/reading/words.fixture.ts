import type { Reading, ReadingWord, Transform } from './reading.ts';

const letterWidth = 30;
const pitch = 50;

/** Lines of typewriting as recognition would give them, one word after every space; words may be given a confidence. */
export function readWords(lines: readonly string[], confidences: Record<string, number> = {}): ReadingWord[] {
  return lines.flatMap((line, at) =>
    [...line.matchAll(/\S+/g)].map((match) => ({
      text: match[0],
      raw: match[0],
      confidence: confidences[match[0]] ?? 95,
      box: [
        300 + match.index * letterWidth,
        400 + at * pitch,
        match[0].length * letterWidth - 4,
        32,
      ] as ReadingWord['box'],
      line: at,
      block: 0,
    })),
  );
}

const asDelivered: Transform = [
  [1, 0, 0],
  [0, 1, 0],
];

/** A reading of a letter-size page at 300 dots an inch with these words. */
export const readingOf = (words: ReadingWord[], more: Partial<Reading> = {}): Reading => ({
  recipe: {
    engine: 'made by hand',
    language: 'eng',
    segmentation: 'one-column',
    dpi: 300,
    skewDegrees: 0,
    rulesRemoved: true,
    flattened: true,
  },
  confidence: 95,
  width: 2550,
  height: 3300,
  transform: asDelivered,
  words,
  figures: [],
  ...more,
});
