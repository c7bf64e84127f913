import { fromBase } from '#shared/units/convert.ts';
import { describeValue, type LiveValue } from './describe-value.ts';
import { judgeSpread } from './judge-spread.ts';
import type { CalcProblem } from './problem.ts';
import type { Program } from './program.ts';
import { solve, type Pin, type Solution } from './solve.ts';
import { sensitivitiesOf, spreadOf } from './spread.ts';
import { computeAll, createState, giveValue, type CalcState } from './state.ts';

/** Numbers are in the input's own unit; a text may carry its own. */
export type InputValues = Record<string, number | string>;
export type EvaluateOptions = {
  /** Hold a derived quantity at a value and solve for an input. */
  pin?: Pin | undefined;
  /** Also give `low` and `high`, `rss`, and a `verdict` where the manual prints limits or a tolerance. */
  tolerances?: boolean | undefined;
  /** Also give `sensitivity`. */
  sensitivities?: boolean | undefined;
};
export type Evaluation = {
  values: Record<string, LiveValue>;
  /** Each input's value in its own unit, home included; null where it has none. */
  setting: Record<string, number | null>;
  /** Values that were given for what is not an input. */
  problems: CalcProblem[];
  pinned?: Solution;
};

/** Computes a whole setting. Inputs not given stay at home. */
export function evaluate(program: Program, inputs: InputValues = {}, options: EvaluateOptions = {}): Evaluation {
  const state = createState(program);
  const problems = Object.entries(inputs).flatMap(([symbol, value]) => giveValue(state, symbol, value) ?? []);
  computeAll(state);
  const pinned = options.pin === undefined ? undefined : applyPin(state, options.pin, problems);
  return {
    values: describeAll(state, options),
    setting: settingOf(state),
    problems,
    ...(pinned === undefined ? {} : { pinned }),
  };
}

/** Without a solution the input has no value, and nothing behind it: the old one would be silently wrong. */
function applyPin(state: CalcState, pin: Pin, problems: CalcProblem[]): Solution | undefined {
  const solved = solve(state, pin);
  const slot = state.program.slots.get(pin.solveFor);
  const isInput = slot !== undefined && state.program.cells[slot]?.definition.kind === 'input';
  if (isInput) state.given.set(slot, solved.ok ? solved.value.base : solved.error);
  if (!solved.ok) problems.push(solved.error);
  computeAll(state);
  return solved.ok ? solved.value.solution : undefined;
}

function describeAll(state: CalcState, { tolerances, sensitivities }: EvaluateOptions): Record<string, LiveValue> {
  const spread = tolerances === true ? spreadOf(state) : undefined;
  const sensitivity = sensitivities === true ? sensitivitiesOf(state) : undefined;
  const values: Record<string, LiveValue> = {};
  for (const [symbol, slot] of state.program.slots) {
    const cell = state.program.cells[slot];
    if (cell === undefined) continue;
    const sensed = sensitivity?.get(slot);
    const reach = spread?.get(slot);
    const verdict = reach === undefined ? undefined : judgeSpread(cell.definition, reach);
    values[symbol] = {
      ...describeValue(state, cell),
      ...reach,
      ...(verdict === undefined ? {} : { verdict }),
      ...(sensed === undefined ? {} : { sensitivity: sensed }),
    };
  }
  return values;
}

function settingOf({ program, slots }: CalcState): Record<string, number | null> {
  const inputs = program.cells.filter(({ definition }) => definition.kind === 'input');
  return Object.fromEntries(
    inputs.map(({ definition, slot, unit }) => {
      const value = slots[slot] ?? NaN;
      return [definition.symbol, Number.isNaN(value) ? null : fromBase(value, unit)];
    }),
  );
}
