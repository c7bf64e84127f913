import { compileDerivative, type CompiledDerivative } from '#shared/expressions/compile-derivative.ts';
import { compileExpression, type Compiled } from '#shared/expressions/compile-expression.ts';
import { placeCode, type FlatCode } from '#shared/expressions/flat-code.ts';
import { lowerExpression, startCode } from '#shared/expressions/lower-expression.ts';
import type { ExpressionScope } from '#shared/expressions/scope.ts';
import type { Expression } from '#shared/expressions/tree.ts';
import type { UnitDefinition } from '#shared/units/definitions.ts';
import { orderSlots } from './order.ts';
import type { CalcProblem } from './problem.ts';
import type { QuantityDefinition } from './quantity.ts';
import { dimensionsOf, prepareQuantities, type Prepared } from './prepare.ts';
import { viewTable, type LookupTable } from './tables.ts';

/** One quantity, ready to compute. Its slot is its place in `Program.cells` and in the array of values. */
export type Cell = {
  slot: number;
  definition: QuantityDefinition;
  unit: UnitDefinition;
  /** Base units; undefined for a derived quantity, and for one whose home is missing or wrong. */
  home: number | undefined;
  formula?: { expression: Expression; compute: Compiled; derivative: () => CompiledDerivative };
  dependsOn: readonly number[];
  dependants: readonly number[];
  /** A problem of the definition itself: the quantity has no value whatever the setting. */
  problem?: CalcProblem;
  /** The home is missing or wrong: an input works again once a value is set. */
  homeProblem?: CalcProblem;
};

export type Program = {
  cells: readonly Cell[];
  slots: ReadonlyMap<string, number>;
  scope: ExpressionScope;
  tables: readonly LookupTable[];
  /** The symbol of each slot. */
  symbols: readonly string[];
  /** Symbols in an order in which each comes after all it depends on. Rings, and what depends on them, are left out. */
  order: readonly string[];
  orderedSlots: Int32Array;
  /** Place of each slot in `orderedSlots`, -1 for those left out. */
  positions: Int32Array;
  /** All formulas as one list of operations over one array of numbers. */
  flat: FlatCode;
  /** What each quantity's expression names directly, in order of appearance. */
  dependsOn: ReadonlyMap<string, readonly string[]>;
  problems: readonly CalcProblem[];
};

/** Compiles the quantities of a manual. Never fails as a whole: what is wrong is listed in `problems`, the rest computes. */
export function compile(definitions: readonly QuantityDefinition[], tables: readonly LookupTable[] = []): Program {
  const { scope, problems: tableProblems } = scopeOver(definitions, tables);
  const prepared = prepareQuantities(definitions, scope);
  const { order, rings } = orderSlots(prepared.map(({ dependsOn }) => dependsOn));
  const cells = finishCells(prepared, rings, scope);
  const slots = new Map<string, number>();
  for (const { slot, definition } of cells) if (!slots.has(definition.symbol)) slots.set(definition.symbol, slot);
  const positions = new Int32Array(cells.length).fill(-1);
  order.forEach((slot, position) => (positions[slot] = position));
  const symbolOf = (slot: number): string => cells[slot]?.definition.symbol ?? '';
  return {
    cells,
    slots,
    scope,
    tables,
    symbols: cells.map(({ definition }) => definition.symbol),
    order: order.map(symbolOf),
    orderedSlots: Int32Array.from(order),
    positions,
    flat: flatten(cells, order, scope),
    dependsOn: new Map([...slots].map(([symbol, slot]) => [symbol, (cells[slot]?.dependsOn ?? []).map(symbolOf)])),
    problems: [...tableProblems, ...cells.flatMap(({ problem, homeProblem }) => problem ?? homeProblem ?? [])],
  };
}

function flatten(cells: readonly Cell[], order: readonly number[], scope: ExpressionScope): FlatCode {
  const code = startCode(cells.length);
  for (const slot of order) {
    const formula = cells[slot]?.formula;
    if (formula !== undefined) lowerExpression(formula.expression, { code, scope, owner: slot });
  }
  return placeCode(code);
}

function scopeOver(
  definitions: readonly QuantityDefinition[],
  tables: readonly LookupTable[],
): { scope: ExpressionScope; problems: CalcProblem[] } {
  const problems: CalcProblem[] = [];
  const views = new Map<string, NonNullable<ReturnType<typeof viewTable>>>();
  for (const table of tables) {
    const view = viewTable(table);
    if (view !== null) views.set(table.id, view);
    else
      problems.push({
        code: 'bad-table',
        symbol: table.id,
        message: `The table "${table.id}" has a unit in its heads that is not known.`,
      });
  }
  const firstSlots = new Map<string, number>();
  definitions.forEach(({ symbol }, slot) => {
    if (!firstSlots.has(symbol)) firstSlots.set(symbol, slot);
  });
  const dimensions = dimensionsOf(definitions);
  const scope: ExpressionScope = {
    dimensionOf: (symbol) => dimensions.get(symbol),
    slotOf: (symbol) => firstSlots.get(symbol) ?? -1,
    findTable: (id) => views.get(id),
  };
  return { scope, problems };
}

function finishCells(prepared: readonly Prepared[], rings: readonly number[][], scope: ExpressionScope): Cell[] {
  const dependants: number[][] = prepared.map(() => []);
  prepared.forEach(({ dependsOn }, slot) => dependsOn.forEach((on) => dependants[on]?.push(slot)));
  const ringOf = new Map(rings.flatMap((ring) => ring.map((slot) => [slot, ring] as const)));
  const symbolOf = (slot: number): string => prepared[slot]?.definition.symbol ?? '';
  return prepared.map(({ expression, problem: own, ...rest }, slot) => {
    const ring = ringOf.get(slot);
    const problem = own ?? (ring === undefined ? undefined : ringProblem(ring.map(symbolOf), symbolOf(slot)));
    const cell: Cell = { slot, ...rest, dependants: dependants[slot] ?? [] };
    if (problem !== undefined) return { ...cell, problem };
    return expression === undefined ? cell : { ...cell, formula: formulaOf(expression, scope) };
  });
}

/** For solving and slopes; compiled when first asked for, because most sessions never do. Settings are computed by the flat code. */
function formulaOf(expression: Expression, scope: ExpressionScope): NonNullable<Cell['formula']> {
  let compiled: Compiled | undefined;
  let derivative: CompiledDerivative | undefined;
  return {
    expression,
    compute: (slots) => (compiled ??= compileExpression(expression, scope))(slots),
    derivative: () => (derivative ??= compileDerivative(expression, scope)),
  };
}

function ringProblem(ring: readonly string[], symbol: string): CalcProblem {
  const from = Math.max(0, ring.indexOf(symbol));
  const round = [...ring.slice(from), ...ring.slice(0, from), symbol].join(' needs ');
  return {
    code: 'cycle',
    symbol,
    message: `${symbol} goes round in a ring: ${round}. Break the ring by making one of them an input.`,
  };
}

/** Everything a quantity rests on, directly or through others. */
export function allDependsOn(program: Program, symbol: string): string[] {
  const seen = new Set<string>();
  const waiting = [...(program.dependsOn.get(symbol) ?? [])];
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    if (seen.has(next)) continue;
    seen.add(next);
    waiting.push(...(program.dependsOn.get(next) ?? []));
  }
  return program.order.filter((each) => seen.has(each));
}
