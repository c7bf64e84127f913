import { kernels, wordsPerOperation, type FlatMachine } from './flat-kernels.ts';
import type { LoweredCode } from './lower-expression.ts';
import { scheduleCode } from './schedule-code.ts';

/**
 * All formulas of a program as one list of operations. Operations of one kind that need nothing of each other stand side by
 * side: a run, which is one loop. Operands are places in the registers: the slots, then the constants, then what lies between.
 */
export type FlatCode = {
  machine: Omit<FlatMachine, 'registers'>;
  /** Which run each operation belongs to, and what each run does. */
  runOf: Int32Array;
  runKinds: Int32Array;
  /** The operations of slot s: `ownOps` from `ownStart[s]` to `ownStart[s + 1]`. */
  ownStart: Int32Array;
  ownOps: Int32Array;
  /** What the registers hold before anything is computed: NaN in the slots, the constants behind them. */
  initial: Float64Array;
};

/** Some or all operations of a program, ready to run: each run's kind, and where in the code it ends. */
export type FlatPlan = { machine: FlatMachine; kinds: Int32Array; ends: Int32Array };

export function placeCode(code: LoweredCode): FlatCode {
  const count = code.codes.length;
  const { order, runOf, runKinds } = scheduleCode(code);
  const words = new Int32Array(count * wordsPerOperation);
  const registerOf = new Int32Array(count);
  let next = code.slotCount + code.constants.size;
  // What an operand comes from stands before, so its register is known.
  const place = (ref: number): number => (ref < 0 ? (registerOf[-ref - 1] ?? 0) : ref);
  for (let to = 0; to < count; to += 1) {
    const at = order[to] ?? 0;
    const owner = code.owners[at] ?? 0;
    const isLast = code.lastOps[owner] === at;
    registerOf[at] = isLast ? owner : next;
    if (!isLast) next += 1;
    words.set(
      [registerOf[at], place(code.a[at] ?? 0), place(code.b[at] ?? 0), place(code.c[at] ?? 0)],
      to * wordsPerOperation,
    );
  }
  const initial = new Float64Array(next).fill(NaN);
  for (const [value, ref] of code.constants) initial[ref] = value;
  return { machine: { code: words, columns: code.columns }, runOf, runKinds, ...ownersOf(code, order), initial };
}

function ownersOf({ owners, slotCount }: LoweredCode, order: Int32Array): Pick<FlatCode, 'ownStart' | 'ownOps'> {
  const ownStart = new Int32Array(slotCount + 1);
  for (const owner of owners) ownStart[owner + 1] = (ownStart[owner + 1] ?? 0) + 1;
  for (let slot = 0; slot < slotCount; slot += 1)
    ownStart[slot + 1] = (ownStart[slot + 1] ?? 0) + (ownStart[slot] ?? 0);
  const fill = ownStart.slice();
  const ownOps = new Int32Array(owners.length);
  for (let placed = 0; placed < order.length; placed += 1) {
    const owner = owners[order[placed] ?? 0] ?? 0;
    const at = fill[owner] ?? 0;
    ownOps[at] = placed;
    fill[owner] = at + 1;
  }
  return { ownStart, ownOps };
}

/** The operations of these slots; of all of them, without copying anything, where `slots` is left out. */
export function planCode(code: FlatCode, registers: Float64Array, slots?: Int32Array): FlatPlan {
  const { machine, runOf, runKinds, ownStart, ownOps } = code;
  if (slots === undefined) return planOf({ ...machine, registers }, runOf, runKinds);
  let count = 0;
  for (const slot of slots) count += (ownStart[slot + 1] ?? 0) - (ownStart[slot] ?? 0);
  const chosen = new Int32Array(count);
  let at = 0;
  for (const slot of slots) {
    const own = ownOps.subarray(ownStart[slot], ownStart[slot + 1]);
    chosen.set(own, at);
    at += own.length;
  }
  chosen.sort();
  const words = new Int32Array(count * wordsPerOperation);
  const runs = new Int32Array(count);
  for (let to = 0; to < count; to += 1) {
    const from = chosen[to] ?? 0;
    runs[to] = runOf[from] ?? 0;
    for (let word = 0; word < wordsPerOperation; word += 1)
      words[to * wordsPerOperation + word] = machine.code[from * wordsPerOperation + word] ?? 0;
  }
  return planOf({ registers, code: words, columns: machine.columns }, runs, runKinds);
}

function planOf(machine: FlatMachine, runs: Int32Array, runKinds: Int32Array): FlatPlan {
  const [kinds, ends] = [new Int32Array(runs.length), new Int32Array(runs.length)];
  let [count, last] = [0, -1];
  for (let at = 0; at < runs.length; at += 1) {
    const run = runs[at] ?? 0;
    if (run !== last) {
      kinds[count] = runKinds[run] ?? 0;
      count += 1;
      last = run;
    }
    ends[count - 1] = (at + 1) * wordsPerOperation;
  }
  return { machine, kinds: kinds.slice(0, count), ends: ends.slice(0, count) };
}

/** Computes every operation of the plan once. */
export function runPlan({ machine, kinds, ends }: FlatPlan): void {
  let from = 0;
  for (let run = 0; run < kinds.length; run += 1) {
    const to = ends[run] ?? 0;
    kernels[kinds[run] ?? 0]?.(machine, from, to);
    from = to;
  }
}
