import { runPlan, planCode, type FlatPlan } from '#shared/expressions/flat-code.ts';
import { describeValue, type LiveValue } from './describe-value.ts';
import type { CalcProblem } from './problem.ts';
import type { Program } from './program.ts';
import { computeAll, createState, giveValue, settle, takeGiven, type CalcState } from './state.ts';

/** A setting that is being changed: each change recomputes only what rests on it. */
export type LiveSession = {
  /** Sets one input. Returns the symbols whose value, or reason for having none, is now another; or why it cannot be set. */
  set: (symbol: string, value: number | string) => SessionChange;
  /** Back to the home setting, wholly or for one input. */
  reset: (symbol?: string) => SessionChange;
  read: (symbol: string) => LiveValue | undefined;
  readAll: () => Record<string, LiveValue>;
};
export type SessionChange = { changed: string[]; problem?: CalcProblem };

export function createSession(program: Program, inputs: Record<string, number | string> = {}): LiveSession {
  const state = createState(program);
  for (const [symbol, value] of Object.entries(inputs)) giveValue(state, symbol, value);
  computeAll(state);
  const recompute = createRecompute(state);
  return {
    set: (symbol, value) => {
      const problem = giveValue(state, symbol, value);
      if (problem !== undefined) return { changed: [], problem };
      return recompute([program.slots.get(symbol) ?? -1]);
    },
    reset: (symbol) => {
      const slots = symbol === undefined ? [...state.given.keys()] : [program.slots.get(symbol) ?? -1];
      slots.forEach((slot) => state.given.delete(slot));
      return recompute(slots);
    },
    read: (symbol) => {
      const cell = program.cells[program.slots.get(symbol) ?? -1];
      return cell === undefined ? undefined : describeValue(state, cell);
    },
    readAll: () =>
      Object.fromEntries(
        [...program.slots].flatMap(([symbol, slot]) => {
          const cell = program.cells[slot];
          return cell === undefined ? [] : [[symbol, describeValue(state, cell)]];
        }),
      ),
  };
}

/** How many inputs' plans are kept: a person turns one or two knobs, and a plan may be as large as the program. */
const plansKept = 8;

/** Computes what rests on some inputs; what that is, is found once for each choice of inputs. */
function createRecompute(state: CalcState): (slots: readonly number[]) => SessionChange {
  const plans = new Map<string, Rest>();
  return (inputs) => {
    const key = inputs.join(' ');
    const rest = plans.get(key) ?? restOn(state, inputs);
    plans.delete(key);
    plans.set(key, rest);
    const oldest = plans.keys().next().value;
    if (plans.size > plansKept && oldest !== undefined) plans.delete(oldest);
    for (const slot of inputs) takeGiven(state, slot);
    runPlan(rest.plan);
    return changeOf(state.program, settle(state, rest.slots));
  };
}

type Rest = { slots: Int32Array; plan: FlatPlan };

/** The inputs and everything that depends on them, in order. */
function restOn({ program, registers }: CalcState, inputs: readonly number[]): Rest {
  const isReached = new Uint8Array(program.cells.length);
  const waiting = inputs.filter((slot) => (program.positions[slot] ?? -1) >= 0);
  const positions: number[] = [];
  for (let slot = waiting.pop(); slot !== undefined; slot = waiting.pop()) {
    const position = program.positions[slot] ?? -1;
    if (isReached[slot] === 1 || position < 0) continue;
    isReached[slot] = 1;
    positions.push(position);
    for (const dependant of program.cells[slot]?.dependants ?? []) waiting.push(dependant);
  }
  const slots = Int32Array.from(positions)
    .sort()
    .map((position) => program.orderedSlots[position] ?? 0);
  return { slots, plan: planCode(program.flat, registers, slots) };
}

/** The names are only looked up where somebody asks for them. */
function changeOf({ symbols }: Program, slots: Int32Array): SessionChange {
  let changed: string[] | undefined;
  return {
    get changed() {
      if (changed === undefined) {
        changed = [];
        for (let at = 0; at < slots.length; at += 1) changed.push(symbols[slots[at] ?? 0] ?? '');
      }
      return changed;
    },
  };
}
