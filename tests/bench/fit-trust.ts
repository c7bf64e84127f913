import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import type { Reading, ReadingWord } from '#shared/reading/reading.ts';
import { withoutSpecks } from '#shared/reading/specks.ts';
import { featureNames, featuresOf, oddsOf } from '#shared/reading/trust.ts';
import { type ReadWord, type TrueWord, judged } from './confidence.ts';
import { delivered } from './recognition.ts';

/**
 * Fits the numbers of `shared/reading/trust.ts` to pages whose text is known and prints them:
 * `tsx tests/bench/fit-trust.ts FOLDER ...`, with folders kept by the bench of recognition.
 */
type Example = { inputs: number[]; isRight: boolean };

function examplesIn(folder: string): Example[] {
  const pages = path.join(folder, 'pages');
  return readdirSync(pages)
    .filter((name) => name.endsWith('.json'))
    .flatMap((name) => {
      const { id, words } = JSON.parse(readFileSync(path.join(pages, name), 'utf8')) as {
        id: string;
        words: TrueWord[];
      };
      const reading = JSON.parse(readFileSync(path.join(folder, `${id}.reading.json`), 'utf8')) as Reading;
      const wordOf = new Map<ReadWord, ReadingWord>(
        withoutSpecks(reading.words).map((word) => [
          { text: word.text, conf: word.confidence, box: delivered(word.box, reading.transform) },
          word,
        ]),
      );
      return judged(words, [...wordOf.keys()]).flatMap(({ raw, isRight }) => {
        const word = wordOf.get(raw);
        return word === undefined
          ? []
          : [{ inputs: [1, oddsOf(word.confidence), ...featuresOf(word).map(Number)], isRight }];
      });
    });
}

/** Gradient descent with a light pull to nought (all but the first two), which keeps rare features from running away. */
function fit(examples: readonly Example[]): number[] {
  const pull = 0.5;
  const weights = new Array<number>(examples[0]?.inputs.length ?? 0).fill(0);
  for (let round = 0; round < 4000; round += 1) {
    const slope = weights.map((weight, index) => (index < 2 ? 0 : -pull * weight));
    for (const { inputs, isRight } of examples) {
      const odds = inputs.reduce((sum, input, index) => sum + input * (weights[index] ?? 0), 0);
      const miss = Number(isRight) - 1 / (1 + Math.exp(-odds));
      inputs.forEach((input, index) => (slope[index] = (slope[index] ?? 0) + miss * input));
    }
    slope.forEach((each, index) => (weights[index] = (weights[index] ?? 0) + (each / examples.length) * rate));
  }
  return weights;
}

const rate = 4;

const examples = process.argv.slice(2).flatMap(examplesIn);
console.log(`${examples.length} words, ${examples.filter(({ isRight }) => !isRight).length} of them wrong`);
fit(examples).forEach((weight, index) =>
  console.log(`${['base', 'odds', ...featureNames][index]}: ${weight.toFixed(2)}`),
);
process.exit(0);
