import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { projectRoot } from '#server/db/database.ts';
import { type Network, likelihoods, packed } from '#shared/reading/glyphs/network.ts';
import { inputs } from '#shared/reading/glyphs/patch.ts';
import { randomFromSeed } from '#shared/kit/random.ts';
import { capitalOf, flatThree, fractions, hasGlyph, registeredFaces, sample } from './glyph-samples.ts';

/**
 * Trains the classifier of signs that the English model cannot write, on glyphs drawn from the faces there are and aged,
 * and writes its weights. The same faces and seed give the same weights. With `check`, it first trains without each of
 * three faces and tells how well those are read.
 */
const signs = ['±', 'µ', 'Ω', '×', '°', '–', ...Object.keys(fractions)];
const plain = [...'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+*£#$%&()/-=.,:;"\'!?©®¢€@§'];
const classes = [...signs, ...plain];
const hidden = 48;
const epochs = 14;
const samplesOfSign = 80;
const samplesOfPlain = 22;

type Sample = { given: Float32Array; wanted: number };

function samplesOf(faces: readonly string[], seed: number, share = 1): Map<string, Sample[]> {
  const random = randomFromSeed(seed);
  return new Map(
    faces.map((face) => {
      const capital = capitalOf(face);
      const glyphs = [...classes.filter((glyph) => glyph in fractions || hasGlyph(face, glyph)), flatThree];
      const own = glyphs.flatMap((glyph) => {
        const wanted = classes.indexOf(glyph === flatThree ? '3' : glyph);
        const count = Math.round(
          (signs.includes(glyph) || '35'.includes(glyph.at(-1) ?? ' ') ? samplesOfSign : samplesOfPlain) * share,
        );
        return Array.from({ length: count }, () => sample({ face, glyph, capital }, random)).flatMap((given) =>
          given === null ? [] : [{ given, wanted }],
        );
      });
      return [face, own];
    }),
  );
}

function freshNetwork(random: () => number): Network {
  const filled = (to: number, from: number): Float32Array =>
    Float32Array.from({ length: to * (from + 1) }, () => (random() - 0.5) * 2 * Math.sqrt(2 / from));
  return {
    inputs,
    hidden,
    classes: classes.length,
    first: filled(hidden, inputs),
    second: filled(classes.length, hidden),
  };
}

/** Stochastic gradient descent with momentum on the cross entropy, one sample at a time, the step falling to nothing. */
function train(samples: readonly Sample[], seed: number): Network {
  const random = randomFromSeed(seed);
  const network = freshNetwork(random);
  const order = samples.map((_, at) => at);
  const total = epochs * samples.length;
  let done = 0;
  for (let epoch = 0; epoch < epochs; epoch += 1) {
    for (let at = order.length - 1; at > 0; at -= 1) {
      const other = Math.floor(random() * (at + 1));
      [order[at], order[other]] = [order[other] ?? 0, order[at] ?? 0];
    }
    for (const at of order) {
      const each = samples[at];
      if (each !== undefined) learn(network, each, 0.012 * (1 - done / total));
      done += 1;
    }
  }
  return network;
}

function learn({ first, second, classes: count }: Network, { given, wanted }: Sample, rate: number): void {
  const between = rowsOf(first, given, hidden).map((value) => Math.max(0, value));
  const scores = rowsOf(second, between, count);
  const highest = Math.max(...scores);
  const odds = scores.map((score) => Math.exp(score - highest));
  const sum = odds.reduce((total, each) => total + each, 0);
  const slopes = odds.map((each, row) => each / sum - (row === wanted ? 1 : 0));
  const back = learnRows(second, between, { slopes, rate });
  learnRows(first, given, { slopes: back.map((slope, row) => ((between[row] ?? 0) > 0 ? slope : 0)), rate });
}

/** Rows of weights, bias last, times what is given. */
function rowsOf(weights: Float32Array, given: Float32Array, rows: number): Float32Array {
  const out = new Float32Array(rows);
  for (let row = 0; row < rows; row += 1) {
    const base = row * (given.length + 1);
    let sum = weights[base + given.length] ?? 0;
    for (let at = 0; at < given.length; at += 1) sum += (weights[base + at] ?? 0) * (given[at] ?? 0);
    out[row] = sum;
  }
  return out;
}

/** Moves rows of weights down their slopes and tells the slopes of what they were given. */
function learnRows(
  weights: Float32Array,
  given: Float32Array,
  { slopes, rate }: { slopes: Float32Array; rate: number },
): Float32Array {
  const back = new Float32Array(given.length);
  for (const [row, slope] of slopes.entries()) {
    if (Math.abs(slope) < 1e-4) continue;
    const base = row * (given.length + 1);
    for (let at = 0; at < given.length; at += 1) {
      const weight = weights[base + at] ?? 0;
      back[at] = (back[at] ?? 0) + slope * weight;
      weights[base + at] = weight - rate * slope * (given[at] ?? 0);
    }
    weights[base + given.length] = (weights[base + given.length] ?? 0) - rate * slope;
  }
  return back;
}

const sureAbove = 0.9;

/** How a face is read: signs found, signs found with enough certainty to be used, other glyphs surely taken for a sign. */
function report(network: Network, face: string, samples: readonly Sample[]): string {
  const of = { signs: 0, right: 0, sure: 0, plain: 0, taken: 0 };
  for (const { given, wanted } of samples) {
    const odds = likelihoods(network, given);
    const best = odds.indexOf(Math.max(...odds));
    const isSure = (odds[best] ?? 0) >= sureAbove;
    if (wanted < signs.length) {
      of.signs += 1;
      if (best === wanted) of.right += 1;
      if (best === wanted && isSure) of.sure += 1;
    } else {
      of.plain += 1;
      if (best < signs.length && isSure) of.taken += 1;
    }
  }
  const share = (part: number, all: number): string => `${((part / all) * 100).toFixed(2)} %`;
  return `${face.padEnd(24)} signs right ${share(of.right, of.signs)}, surely ${share(of.sure, of.signs)}; others surely taken for a sign ${share(of.taken, of.plain)}`;
}

const seed = 20;
const faces = registeredFaces();
const training = samplesOf(faces, seed);
const fresh = samplesOf(faces, seed + 1, 0.4);
const allBut = (left: readonly string[]): Sample[] =>
  faces.filter((face) => !left.includes(face)).flatMap((face) => training.get(face) ?? []);

if (process.argv.includes('check')) {
  const heldOut = faces.filter((face) =>
    /^(C059Roman|CourierPrime|courierprime|NimbusSansRegular|SpecialElite|specialelite)/.test(face),
  );
  const kin = faces.filter((face) => /^(C059|CourierPrime|courierprime|NimbusSans|specialelite)/.test(face));
  const network = train(allBut(kin), seed);
  console.log(`faces and their kin left out of the training (${faces.length - kin.length} faces left):`);
  for (const face of heldOut) console.log(`  ${report(network, face, fresh.get(face) ?? [])}`);
}
const network = train(allBut([]), seed);
console.log('all faces trained on, fresh samples:');
for (const face of faces) console.log(`  ${report(network, face, fresh.get(face) ?? [])}`);
const [first, second] = [packed(network.first), packed(network.second)];
const target = path.join(projectRoot, 'shared/reading/glyphs/weights.ts');
writeFileSync(
  target,
  `// Written by server/scripts/train-glyphs.ts: do not edit.
export const glyphs = ${JSON.stringify(classes)};
export const hidden = ${hidden};
export const first = { step: ${first.step}, packed: '${first.packed}' };
export const second = { step: ${second.step}, packed: '${second.packed}' };
`,
);
console.log(`${target}: ${((first.packed.length + second.packed.length) / 1024).toFixed(1)} kB`);
