import { compile } from '#shared/calc/program.ts';
import { createSession } from '#shared/calc/live-session.ts';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import { against, medianMs } from './timing.ts';

const size = 1000;

/** A fan and a chain of frequencies: every value depends, by one way or another, on the one input. */
const definitions = Array.from({ length: size }, (_, at): QuantityDefinition => {
  const common = { symbol: `q${at}`, label: '', unit: 'MHz' };
  if (at === 0) return { ...common, kind: 'input', home: 156.6 };
  return {
    ...common,
    kind: 'derived',
    expression: `(q${Math.floor(at / 2)} - 10.7 MHz) / 9 + q${Math.floor(at / 3)} * 2`,
  };
});

function byHand(input: number): number {
  const values = new Float64Array(size);
  values[0] = input * 1e6;
  for (let at = 1; at < size; at += 1) {
    values[at] = ((values[Math.floor(at / 2)] ?? 0) - 10.7e6) / 9 + (values[Math.floor(at / 3)] ?? 0) * 2;
  }
  return values[size - 1] ?? 0;
}

export async function benchRecompute(): Promise<string[]> {
  const session = createSession(compile(definitions));
  let turn = 0;
  const rounds = 200;
  const ours = await medianMs(9, () => {
    for (let round = 0; round < rounds; round += 1) session.set('q0', 156 + ((turn += 1) % 20) / 20);
  });
  const hand = await medianMs(9, () => {
    let sum = 0;
    for (let round = 0; round < rounds; round += 1) sum += byHand(156 + ((turn += 1) % 20) / 20);
    return sum;
  });
  const compiling = await medianMs(3, () => compile(definitions));
  return [
    against(
      `one change of an input among ${size} quantities`,
      ours / rounds,
      'the same arithmetic by hand in plain JavaScript',
      hand / rounds,
    ),
    `compiling the ${size}: ${compiling.toFixed(1)} ms`,
  ];
}
