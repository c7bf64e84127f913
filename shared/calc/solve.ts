import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { isAbout } from '#shared/expressions/compile-expression.ts';
import { childrenOf, type ExpressionNode } from '#shared/expressions/tree.ts';
import { fromBase, toBase } from '#shared/units/convert.ts';
import { findRoot } from './find-root.ts';
import type { CalcProblem } from './problem.ts';
import type { Cell, Program } from './program.ts';
import { readValue } from './read-value.ts';
import type { CalcState } from './state.ts';

/** Hold the derived quantity `symbol` at `value` (a number in its unit, or text) by changing the input `solveFor`. */
export type Pin = { symbol: string; value: number | string; solveFor: string };
export type Solution = {
  symbol: string;
  solveFor: string;
  /** What the input must be, in its own unit. */
  value: number;
  /** In the held quantity's unit. A whole number or a row of a table can only come near: `error` is achieved less wanted. */
  wanted: number;
  achieved: number;
  error: number;
  exact: boolean;
  method: 'affine' | 'bracketed' | 'nearest';
};
type Solved = { solution: Solution; base: number };
type Task = { state: CalcState; held: Cell; input: Cell; target: number; y: (x: number) => number; start: number };

/** Solves at the state's present setting; the state itself is left as it is. */
export function solve(state: CalcState, pin: Pin): Result<Solved, CalcProblem> {
  const task = prepareTask(state, pin);
  if (!task.ok) return task;
  const candidates = candidatesFor(task.value);
  return candidates === undefined ? solveSmooth(task.value) : solveNearest(task.value, candidates);
}

function prepareTask(state: CalcState, { symbol, value, solveFor }: Pin): Result<Task, CalcProblem> {
  const { program, slots } = state;
  const held = program.cells[program.slots.get(symbol) ?? -1];
  const input = program.cells[program.slots.get(solveFor) ?? -1];
  if (held === undefined)
    return fail({ code: 'unknown-symbol', symbol, message: `There is no quantity "${symbol}" to hold.` });
  if (input?.definition.kind !== 'input')
    return fail({
      code: 'not-an-input',
      symbol: solveFor,
      message: `"${solveFor}" is not an input, so it cannot be solved for.`,
    });
  if (held.formula === undefined)
    return fail({
      code: 'no-solution',
      symbol: solveFor,
      message: `${symbol} is not a derived quantity that can be computed, so it cannot be held.`,
    });
  const target = readValue(value, held.definition, held.unit);
  if (!target.ok) return target;
  const path = pathBetween(program, input.slot, held.slot);
  if (path.length === 0)
    return fail({
      code: 'no-solution',
      symbol: solveFor,
      message: `No solution: ${symbol} does not depend on ${solveFor}.`,
    });
  const unit = toBase(1, input.unit);
  const present = slots[input.slot] ?? NaN;
  const start = Number.isNaN(present) ? (input.home ?? unit) : present;
  return succeed({ state, held, input, target: target.value, y: trial(state, input.slot, path), start });
}

/** Slots after `from` and up to `to` that lie on a way from one to the other, in order. */
function pathBetween(program: Program, from: number, to: number): number[] {
  const [after, before] = [new Set([from]), new Set([to])];
  for (const slot of program.orderedSlots)
    if (program.cells[slot]?.dependsOn.some((on) => after.has(on)) === true) after.add(slot);
  for (const slot of program.orderedSlots.toReversed())
    if (before.has(slot)) program.cells[slot]?.dependsOn.forEach((on) => before.add(on));
  return [...program.orderedSlots].filter((slot) => slot !== from && after.has(slot) && before.has(slot));
}

/** The held quantity as a function of the input, on a copy of the slots. */
function trial({ program, slots }: CalcState, input: number, path: readonly number[]): (x: number) => number {
  const copy = slots.slice();
  const steps = path.map((slot) => ({ slot, compute: program.cells[slot]?.formula?.compute ?? (() => NaN) }));
  const last = path.at(-1) ?? input;
  return (x) => {
    copy[input] = x;
    for (const { slot, compute } of steps) copy[slot] = compute(copy);
    const y = copy[last] ?? NaN;
    return Number.isFinite(y) ? y : NaN;
  };
}

function limitsOf({ input }: Task): { low: number; high: number } {
  const { low, high } = input.definition.limits ?? {};
  return {
    low: low === undefined ? -Infinity : toBase(low, input.unit),
    high: high === undefined ? Infinity : toBase(high, input.unit),
  };
}

function solveSmooth(task: Task): Result<Solved, CalcProblem> {
  const { y, target, start, input } = task;
  const scale = Math.abs(start) || toBase(1, input.unit);
  const root = findRoot({ y, target, start, scale, ...limitsOf(task) });
  if (root === undefined) return fail(noSolution(task));
  // 156.95 rather than 156.95000000000002, where the held quantity is met as well.
  const short = toBase(Number(fromBase(root.x, input.unit).toPrecision(14)), input.unit);
  const x =
    Math.abs(y(short) - target) <= Math.max(Math.abs(y(root.x) - target), Math.abs(target) * 1e-14) ? short : root.x;
  return succeed(describe(task, x, root.method));
}

/** How far to look around the present value when a whole number has neither limits nor a table. */
const lookAround = 1000;
const mostCandidates = 20_000;

/** The values that the input can have, where they can be counted; undefined for a continuous one. */
function candidatesFor(task: Task): number[] | undefined {
  const { low, high } = limitsOf(task);
  const allowed = (each: number): boolean => each >= low && each <= high;
  const keys = keysFor(task);
  if (keys.length > 0) return keys.filter(allowed);
  const { input, start, y, target } = task;
  if (input.definition.integer !== true) return undefined;
  const one = toBase(1, input.unit);
  if ((high - low) / one <= mostCandidates)
    return wholeNumbers(Math.ceil(low / one), Math.floor(high / one)).map((each) => each * one);
  const smooth = findRoot({ y, target, start, scale: Math.abs(start) || one, low, high });
  const around = Math.round((smooth?.x ?? start) / one);
  const reach = smooth === undefined ? lookAround : 2;
  return wholeNumbers(around - reach, around + reach)
    .map((each) => each * one)
    .filter(allowed);
}

const wholeNumbers = (first: number, last: number): number[] =>
  Array.from({ length: Math.max(0, last - first + 1) }, (_, at) => first + at);

/** Keys of the tables that are looked into with this very input. */
function keysFor({ state: { program }, input }: Task): number[] {
  const keys = new Set<number>();
  const visit = (node: ExpressionNode): void => {
    if (node.kind === 'lookup' && node.key.kind === 'symbol' && node.key.name === input.definition.symbol) {
      const table = program.tables.find(({ id }) => id === node.table);
      table?.rows.forEach((row) => keys.add(toBase(row[0] ?? NaN, input.unit)));
    }
    childrenOf(node).forEach(visit);
  };
  for (const slot of input.dependants) {
    const root = program.cells[slot]?.formula?.expression.root;
    if (root !== undefined) visit(root);
  }
  return [...keys];
}

function solveNearest(task: Task, candidates: readonly number[]): Result<Solved, CalcProblem> {
  const { y, target, start } = task;
  let best: { x: number; miss: number } | undefined;
  for (const x of candidates) {
    const miss = Math.abs(y(x) - target);
    if (Number.isNaN(miss)) continue;
    const isNearer =
      best === undefined || miss < best.miss || (miss === best.miss && Math.abs(x - start) < Math.abs(best.x - start));
    if (isNearer) best = { x, miss };
  }
  return best === undefined ? fail(noSolution(task)) : succeed(describe(task, best.x, 'nearest'));
}

function describe({ held, input, target, y }: Task, x: number, method: Solution['method']): Solved {
  const [wanted, achieved] = [fromBase(target, held.unit), fromBase(y(x), held.unit)];
  const exact = isAbout(y(x), target);
  const solution: Solution = {
    symbol: held.definition.symbol,
    solveFor: input.definition.symbol,
    value: fromBase(x, input.unit),
    wanted,
    achieved,
    exact,
    method,
    error: exact ? 0 : fromBase(y(x) - target, held.unit),
  };
  return { solution, base: x };
}

function noSolution({ held, input, target }: Task): CalcProblem {
  const wanted = `${Number(fromBase(target, held.unit).toPrecision(12))} ${held.definition.unit}`.trim();
  const { limits, symbol } = input.definition;
  const within = limits === undefined ? '' : ' within its limits';
  return {
    code: 'no-solution',
    symbol,
    message: `No solution: no value of ${symbol}${within} was found that makes ${held.definition.symbol} ${wanted}.`,
  };
}
