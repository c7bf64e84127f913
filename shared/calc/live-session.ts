import { describeValue, type LiveValue } from './describe-value.ts';
import type { CalcProblem } from './problem.ts';
import type { Program } from './program.ts';
import { computeAll, computeSlot, createState, giveValue, type CalcState } from './state.ts';

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
      return { changed: recompute([program.slots.get(symbol) ?? -1]) };
    },
    reset: (symbol) => {
      const slots = symbol === undefined ? [...state.given.keys()] : [program.slots.get(symbol) ?? -1];
      slots.forEach((slot) => state.given.delete(slot));
      return { changed: recompute(slots) };
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

/** One sweep along the order over a byte per quantity; a value that comes out the same stops there. */
function createRecompute(state: CalcState): (slots: readonly number[]) => string[] {
  const { program } = state;
  const isDue = new Uint8Array(program.cells.length);
  return (slots) => {
    let [from, last] = [Infinity, -1];
    const due = (slot: number): void => {
      const position = program.positions[slot] ?? -1;
      if (position < 0) return;
      isDue[position] = 1;
      from = Math.min(from, position);
      last = Math.max(last, position);
    };
    slots.forEach(due);
    const changed: string[] = [];
    for (let position = from; position <= last; position += 1) {
      if (isDue[position] !== 1) continue;
      isDue[position] = 0;
      const slot = program.orderedSlots[position] ?? -1;
      if (!computeSlot(state, slot)) continue;
      const cell = program.cells[slot];
      if (cell === undefined) continue;
      changed.push(cell.definition.symbol);
      cell.dependants.forEach(due);
    }
    return changed;
  };
}
