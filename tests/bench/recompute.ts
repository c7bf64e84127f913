import { compile as compileWithMathjs } from 'mathjs';
import { createSession } from '#shared/calc/live-session.ts';
import { compile, type Program } from '#shared/calc/program.ts';
import { graphSize, handWritten, mathjsTexts, mixedGraph } from './mixed-graph.ts';
import { against, medianMs } from './timing.ts';

let turn = 0;
/** Another value every time, so that everything behind it changes. */
const nextMhz = (): number => 156 + ((turn += 1) % 500) / 20;

/**
 * The works take turns, ten calls each, so that a busy machine is busy for all of them. Fastest and median of a call, in
 * milliseconds, after a warm-up long enough for the compiler to have done all it does (hand-written code needs thousands of calls).
 */
function inTurns(works: Record<string, () => unknown>): Record<string, { fastest: number; median: number }> {
  const [warmUp, turns, calls] = [5000, 300, 10];
  const times: Record<string, number[]> = {};
  for (const [name, work] of Object.entries(works)) {
    for (let call = 0; call < warmUp; call += 1) work();
    times[name] = [];
  }
  for (let round = 0; round < turns; round += 1) {
    for (const [name, work] of Object.entries(works)) {
      const from = performance.now();
      for (let call = 0; call < calls; call += 1) work();
      times[name]?.push((performance.now() - from) / calls);
    }
  }
  return Object.fromEntries(
    Object.entries(times).map(([name, each]) => {
      const sorted = each.sort((a, b) => a - b);
      return [name, { fastest: sorted[0] ?? NaN, median: sorted[Math.floor(turns / 2)] ?? NaN }];
    }),
  );
}

export async function benchRecompute(): Promise<string[]> {
  const program = compile(mixedGraph);
  const session = createSession(program);
  const hand = await handWritten();
  const values = new Float64Array(graphSize);
  values[1] = 145.9e6;
  const byHand = 'by hand, a statement each';
  const measured = inTurns({
    [byHand]: () => {
      values[0] = nextMhz() * 1e6;
      hand.statements(values);
    },
    'by hand, a function each': () => {
      values[0] = nextMhz() * 1e6;
      for (const each of hand.functions) each(values);
    },
    'one change': () => session.set('q0', nextMhz()),
    'one change, and the names of what changed': () => session.set('q0', nextMhz()).changed.length,
  });
  const reference = measured[byHand] ?? { fastest: NaN, median: NaN };
  return [
    `an input that moves all of ${graphSize} quantities, 100 deep; ${checkAgreement(program, hand.statements)}`,
    ...Object.entries(measured).map(
      ([name, { fastest, median }]) =>
        `${name}: fastest ${fastest.toFixed(3)} ms, median ${median.toFixed(3)} ms; to ${byHand}: ${(fastest / reference.fastest).toFixed(2)}, ${(median / reference.median).toFixed(2)}`,
    ),
    against('one change', measured['one change']?.median ?? NaN, "mathjs's compiled expressions", await mathjsMs()),
    ...incremental(program),
    `compiling the ${graphSize}: ${(await medianMs(9, () => compile(mixedGraph))).toFixed(1)} ms`,
  ];
}

/** A comparison of speed is worth nothing between two that compute different things. */
function checkAgreement(program: Program, byHand: (values: Float64Array) => void): string {
  const session = createSession(program, { q0: 157.1 });
  const values = new Float64Array(graphSize);
  values.set([157.1e6, 145.9e6]);
  byHand(values);
  let worst = 0;
  for (const [at, { definition }] of program.cells.entries()) {
    const mhz = session.read(definition.symbol)?.value ?? NaN;
    worst = Math.max(worst, Math.abs((mhz * 1e6) / (values[at] ?? NaN) - 1));
  }
  return `both agree to ${worst.toExponential(1)} of the value`;
}

async function mathjsMs(): Promise<number> {
  const compiled = mathjsTexts.map((text) => compileWithMathjs(text));
  const scope = new Map<string, unknown>();
  return medianMs(5, () => {
    scope.set('q0', nextMhz() * 1e6);
    scope.set('q1', 145.9e6);
    compiled.forEach((each, at) => scope.set(`q${at + 2}`, each.evaluate(scope)));
  });
}

function incremental(program: Program): string[] {
  const session = createSession(program);
  const from = performance.now();
  const touched = session.set('q1', nextMhz()).changed.length;
  const first = performance.now() - from;
  const { later } = inTurns({ later: () => session.set('q1', nextMhz()).changed.length });
  return [
    `a change that touches ${touched}: the first time ${first.toFixed(3)} ms, then ${later?.median.toFixed(4)} ms, names included`,
  ];
}
