import { kernels } from './flat-kernels.ts';
import type { LoweredCode } from './lower-expression.ts';

/** `order`: operations in the order of running; `runOf`: the run that each place of it belongs to; `runKinds`: what each run does. */
export type Schedule = { order: Int32Array; runOf: Int32Array; runKinds: Int32Array };

/**
 * Puts operations in an order in which each comes after what it needs, with as few runs of one kind as a greedy choice gives:
 * always the kind of which most are ready. On a graph 100 deep that made a third of the runs that going level by level did.
 */
export function scheduleCode(code: LoweredCode): Schedule {
  const count = code.codes.length;
  const needs = consumersOf(code);
  const ready: number[][] = kernels.map(() => []);
  const makeReady = (at: number): void => void ready[code.codes[at] ?? 0]?.push(at);
  for (let at = 0; at < count; at += 1) if (needs.waitsFor[at] === 0) makeReady(at);
  const [order, runOf] = [new Int32Array(count), new Int32Array(count)];
  const runKinds: number[] = [];
  for (let placed = 0; placed < count;) {
    const kind = longest(ready);
    const run = ready[kind] ?? [];
    if (run.length === 0) break;
    ready[kind] = [];
    order.set(run, placed);
    runOf.fill(runKinds.length, placed, placed + run.length);
    placed += run.length;
    runKinds.push(kind);
    for (const at of run) release(at, needs, makeReady);
  }
  return { order, runOf, runKinds: Int32Array.from(runKinds) };
}

/** What waited for nothing but this is ready now. */
function release(at: number, { start, consumers, waitsFor }: Needs, makeReady: (at: number) => void): void {
  for (let to = start[at] ?? 0; to < (start[at + 1] ?? 0); to += 1) {
    const consumer = consumers[to] ?? 0;
    const left = (waitsFor[consumer] ?? 0) - 1;
    waitsFor[consumer] = left;
    if (left === 0) makeReady(consumer);
  }
}

function longest(lists: readonly (readonly number[])[]): number {
  let best = 0;
  for (let at = 1; at < lists.length; at += 1) if ((lists[at]?.length ?? 0) > (lists[best]?.length ?? 0)) best = at;
  return best;
}

/** Who needs each operation's result, flat: those of operation i are `consumers` from `start[i]` to `start[i + 1]`. */
type Needs = { start: Int32Array; consumers: Int32Array; waitsFor: Int32Array };

function consumersOf(code: LoweredCode): Needs {
  const count = code.codes.length;
  const [start, waitsFor] = [new Int32Array(count + 1), new Int32Array(count)];
  eachNeed(code, (at, needed) => {
    start[needed + 1] = (start[needed + 1] ?? 0) + 1;
    waitsFor[at] = (waitsFor[at] ?? 0) + 1;
  });
  for (let at = 0; at < count; at += 1) start[at + 1] = (start[at + 1] ?? 0) + (start[at] ?? 0);
  const fill = start.slice();
  const consumers = new Int32Array(start[count] ?? 0);
  eachNeed(code, (at, needed) => {
    const to = fill[needed] ?? 0;
    consumers[to] = at;
    fill[needed] = to + 1;
  });
  return { start, consumers, waitsFor };
}

/** Operands that are no results (masks, columns, constants) are past the slots or slots without a formula: no operation gives them. */
function eachNeed({ codes, a, b, c, lastOps }: LoweredCode, visit: (at: number, needed: number) => void): void {
  for (let at = 0; at < codes.length; at += 1) {
    for (const ref of [a[at] ?? 0, b[at] ?? 0, c[at] ?? 0]) {
      const needed = ref < 0 ? -ref - 1 : (lastOps[ref] ?? -1);
      // A mask or a column may look like a slot: what is needed for nothing must at least come before.
      if (needed >= 0 && needed < at) visit(at, needed);
    }
  }
}
