import type { ReadingWord } from './reading.ts';

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
