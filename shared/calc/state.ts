import { explainFailure } from '#shared/expressions/explain-failure.ts';
import type { CalcProblem } from './problem.ts';
import type { Cell, Program } from './program.ts';
import { readValue } from './read-value.ts';

/** The numbers of one setting: base units in slots, NaN exactly where `problems` says why. */
export type CalcState = {
  program: Program;
  slots: Float64Array;
  problems: Map<number, CalcProblem>;
  /** What was set for an input, in base units or as the problem of what was set; home where nothing was. */
  given: Map<number, number | CalcProblem>;
};

/** Everything at home, computed in full. */
export function createState(program: Program): CalcState {
  const state: CalcState = {
    program,
    slots: new Float64Array(program.cells.length).fill(NaN),
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
  for (const slot of state.program.orderedSlots) computeSlot(state, slot);
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

/** Computes one slot from those before it. True where the value, or the reason for having none, is another than before. */
export function computeSlot(state: CalcState, slot: number): boolean {
  const cell = state.program.cells[slot];
  if (cell === undefined) return false;
  const outcome = outcomeOf(state, cell);
  const before = state.slots[slot] ?? NaN;
  if (typeof outcome === 'number') {
    state.slots[slot] = outcome;
    return !Object.is(before, outcome);
  }
  const problem = state.problems.get(slot);
  state.slots[slot] = NaN;
  state.problems.set(slot, outcome);
  return problem === undefined || problem.message !== outcome.message;
}

function outcomeOf(state: CalcState, cell: Cell): number | CalcProblem {
  if (cell.problem !== undefined) return cell.problem;
  const outcome = cell.formula === undefined ? givenOf(state, cell) : derivedOf(state, cell);
  if (typeof outcome === 'number' && state.problems.size > 0) state.problems.delete(cell.slot);
  return outcome;
}

function givenOf({ given }: CalcState, { slot, home, homeProblem, definition }: Cell): number | CalcProblem {
  const missing: CalcProblem = {
    code: 'missing-home',
    symbol: definition.symbol,
    message: `${definition.symbol} has no value.`,
  };
  return given.get(slot) ?? home ?? homeProblem ?? missing;
}

function derivedOf(state: CalcState, cell: Cell): number | CalcProblem {
  const { slots } = state;
  // A conditional might not look at a missing value; downstream of a problem nothing may show a number all the same.
  for (const on of cell.dependsOn) if (Number.isNaN(slots[on])) return behind(state, cell, on);
  const value = cell.formula?.compute(slots) ?? NaN;
  // -0 would be another value than 0 to Object.is, and no other to a reader.
  if (Number.isFinite(value)) return value === 0 ? 0 : value;
  return failureOf(state, cell);
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
