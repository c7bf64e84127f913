import { explainFailure } from '#shared/expressions/explain-failure.ts';
import { planCode, runPlan } from '#shared/expressions/flat-code.ts';
import type { CalcProblem } from './problem.ts';
import type { Cell, Program } from './program.ts';
import { readValue } from './read-value.ts';

/** The numbers of one setting: base units in slots, NaN exactly where `problems` says why. */
export type CalcState = {
  program: Program;
  /** The quantities' part of `registers`, in which the flat code computes. */
  slots: Float64Array;
  registers: Float64Array;
  /** The slots as they were when last settled: what differs has changed. */
  shown: Float64Array;
  /** For collecting what changed without asking for memory each time. */
  scratch: Int32Array;
  problems: Map<number, CalcProblem>;
  /** What was set for an input, in base units or as the problem of what was set; home where nothing was. */
  given: Map<number, number | CalcProblem>;
};

/** Everything at home, not yet computed. */
export function createState(program: Program): CalcState {
  const registers = program.flat.initial.slice();
  const state: CalcState = {
    program,
    registers,
    slots: registers.subarray(0, program.cells.length),
    shown: new Float64Array(program.cells.length).fill(NaN),
    scratch: new Int32Array(program.cells.length),
    problems: new Map(),
    given: new Map(),
  };
  for (const cell of program.cells) {
    if ((program.positions[cell.slot] ?? -1) < 0)
      state.problems.set(cell.slot, cell.problem ?? neverOrdered(program, cell));
  }
  return state;
}

export function computeAll(state: CalcState): void {
  for (const cell of state.program.cells) if (cell.formula === undefined) takeGiven(state, cell.slot);
  runPlan(planCode(state.program.flat, state.registers));
  settle(state, state.program.orderedSlots);
}

/** Puts what is given for an input or constant into its slot; what rests on it is still to be computed. */
export function takeGiven(state: CalcState, slot: number): void {
  const cell = state.program.cells[slot];
  if (cell === undefined || (state.program.positions[slot] ?? -1) < 0) return;
  const given = cell.problem ?? givenOf(state, cell);
  state.slots[slot] = typeof given === 'number' ? given : NaN;
}

/** Notes what an input is set to; the caller recomputes. Returns a problem where the symbol is no input at all. */
export function giveValue(state: CalcState, symbol: string, value: number | string): CalcProblem | undefined {
  const slot = state.program.slots.get(symbol);
  const cell = slot === undefined ? undefined : state.program.cells[slot];
  if (cell === undefined)
    return { code: 'unknown-symbol', symbol, message: `There is no quantity "${symbol}" to set.` };
  if (cell.definition.kind !== 'input')
    return {
      code: 'not-an-input',
      symbol,
      message: `${symbol} is ${cell.definition.kind === 'derived' ? 'derived' : 'a constant'} and cannot be set. Set an input, or hold it and solve for one.`,
    };
  const read = readValue(value, cell.definition, cell.unit);
  state.given.set(cell.slot, read.ok ? read.value : read.error);
  return undefined;
}

/**
 * After computing these slots, given in their order: finds the reasons of those that came out without a value.
 * Returns the slots whose value, or reason for having none, is another than before.
 */
export function settle(state: CalcState, computed: Int32Array): Int32Array {
  const { slots, shown, problems, scratch } = state;
  let [count, missing] = [0, 0];
  for (let at = 0; at < computed.length; at += 1) {
    const slot = computed[at] ?? 0;
    const now = slots[slot] ?? NaN;
    const was = shown[slot] ?? NaN;
    if (now === was) continue;
    if (Number.isNaN(now)) {
      missing += 1;
      if (Number.isNaN(was)) continue;
    }
    shown[slot] = now;
    scratch[count] = slot;
    count += 1;
  }
  const hasNoProblem = missing === 0 && problems.size === 0;
  if (hasNoProblem) return count === computed.length ? computed : scratch.slice(0, count);
  const others = explainMissing(state, computed);
  const { positions } = state.program;
  return Int32Array.from([...scratch.subarray(0, count), ...others]).sort(
    (a, b) => (positions[a] ?? 0) - (positions[b] ?? 0),
  );
}

/** Reasons for what has no value, in the order of computing. Returns the slots where only the reason is another. */
function explainMissing(state: CalcState, computed: Int32Array): number[] {
  const { problems, program, slots } = state;
  const otherReason: number[] = [];
  for (const slot of computed) {
    const cell = program.cells[slot];
    if (cell === undefined) continue;
    if (!Number.isNaN(slots[slot])) {
      problems.delete(slot);
      continue;
    }
    const [was, is] = [problems.get(slot), problemOf(state, cell)];
    problems.set(slot, is);
    if (was !== undefined && was.message !== is.message) otherReason.push(slot);
  }
  return otherReason;
}

function problemOf(state: CalcState, cell: Cell): CalcProblem {
  if (cell.problem !== undefined) return cell.problem;
  if (cell.formula === undefined) {
    const given = givenOf(state, cell);
    return typeof given === 'number' ? failureOf(state, cell) : given;
  }
  for (const on of cell.dependsOn) if (Number.isNaN(state.slots[on])) return behind(state, cell, on);
  return failureOf(state, cell);
}

function givenOf({ given }: CalcState, { slot, home, homeProblem, definition }: Cell): number | CalcProblem {
  const { symbol } = definition;
  return given.get(slot) ?? home ?? homeProblem ?? { code: 'missing-home', symbol, message: `${symbol} has no value.` };
}

function failureOf({ program, slots }: CalcState, { definition, formula }: Cell): CalcProblem {
  const { symbol } = definition;
  const failure = formula === undefined ? undefined : explainFailure(formula.expression, program.scope, slots);
  if (failure === undefined) return { code: 'not-finite', symbol, message: `${symbol} has no finite value.` };
  return { code: failure.code, symbol, message: failure.message, ...failure.place };
}

function behind({ program, problems }: CalcState, { definition }: Cell, on: number): CalcProblem {
  const { symbol } = definition;
  const problem = problems.get(on);
  const cause = problem?.cause ?? program.cells[on]?.definition.symbol ?? '';
  const rootSlot = program.slots.get(cause);
  const root = rootSlot === undefined ? undefined : problems.get(rootSlot);
  return {
    code: 'depends-on-unavailable',
    symbol,
    message: `${symbol} needs ${cause}, which has no value. ${root?.message ?? ''}`.trimEnd(),
    cause,
  };
}

/** Behind a ring: the first thing it names that has no place in the order. */
function neverOrdered(program: Program, cell: Cell): CalcProblem {
  const { symbol } = cell.definition;
  const on = cell.dependsOn.find((each) => (program.positions[each] ?? -1) < 0);
  const cause = on === undefined ? symbol : (program.cells[on]?.definition.symbol ?? symbol);
  return {
    code: 'depends-on-unavailable',
    symbol,
    message: `${symbol} needs ${cause}, which lies on a ring or behind one.`,
    cause,
  };
}
