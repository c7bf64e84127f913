/**
 * A network of one hidden layer: `hidden` rows of weights over the inputs and a bias, rectified; then `classes` rows over
 * the hidden values and a bias, as logarithms of odds (softmax). Row by row, bias last.
 */
export type Network = { inputs: number; hidden: number; classes: number; first: Float32Array; second: Float32Array };

/** The likelihood of each class, adding up to 1. */
export function likelihoods({ inputs, hidden, classes, first, second }: Network, given: Float32Array): Float32Array {
  const between = rows(first, given, { from: inputs, to: hidden }).map((value) => Math.max(0, value));
  const scores = rows(second, between, { from: hidden, to: classes });
  const highest = Math.max(...scores);
  const odds = scores.map((score) => Math.exp(score - highest));
  const sum = odds.reduce((total, each) => total + each, 0);
  return odds.map((each) => each / sum);
}

function rows(weights: Float32Array, given: Float32Array, { from, to }: { from: number; to: number }): Float32Array {
  const out = new Float32Array(to);
  for (let row = 0; row < to; row += 1) {
    const base = row * (from + 1);
    let sum = weights[base + from] ?? 0;
    for (let at = 0; at < from; at += 1) sum += (weights[base + at] ?? 0) * (given[at] ?? 0);
    out[row] = sum;
  }
  return out;
}

/** Weights as text: two hexadecimal figures each, 0 to 255 for -127 to 127 steps (plus 128) of `step`. */
export const unpacked = (packed: string, step: number): Float32Array =>
  Float32Array.from(
    { length: packed.length / 2 },
    (_, at) => (parseInt(packed.slice(at * 2, at * 2 + 2), 16) - 128) * step,
  );

export function packed(weights: Float32Array): { packed: string; step: number } {
  const step = weights.reduce((most, each) => Math.max(most, Math.abs(each)), 1e-6) / 127;
  const text = Array.from(weights, (each) => (Math.round(each / step) + 128).toString(16).padStart(2, '0')).join('');
  return { packed: text, step };
}
