import { codeOf, findCode, kernels, nameOf, type Operation } from './flat-kernels.ts';
import type { ExpressionScope, TableColumn } from './scope.ts';
import {
  childrenOf,
  type ArithmeticOperator,
  type ComparisonOperator,
  type Expression,
  type ExpressionNode,
} from './tree.ts';

/**
 * Formulas as lists of operations, in the order they were lowered. An operand is the slot of a quantity (0 and up), a
 * constant (`constantRef`), or the result of an operation before (-1 and down). Placing in registers comes later.
 */
export type LoweredCode = {
  slotCount: number;
  /** Per operation: what it does and its operands. */
  codes: number[];
  a: number[];
  b: number[];
  c: number[];
  /** The quantity whose formula an operation belongs to. */
  owners: number[];
  /** Per quantity: the operation whose result is its value, -1 where no formula gives it. */
  lastOps: Int32Array;
  constants: Map<number, number>;
  constantValues: number[];
  columns: TableColumn[];
  columnRefs: Map<TableColumn, number>;
};
type NodeOf<Kind extends ExpressionNode['kind']> = Extract<ExpressionNode, { kind: Kind }>;
type Lowering = { code: LoweredCode; scope: ExpressionScope; owner: number };

export const startCode = (slotCount: number): LoweredCode => ({
  slotCount,
  codes: [],
  a: [],
  b: [],
  c: [],
  owners: [],
  lastOps: new Int32Array(slotCount).fill(-1),
  constants: new Map(),
  constantValues: [],
  columns: [],
  columnRefs: new Map(),
});

/** Adds the formula of the quantity in slot `owner`; those it names must have been added before. */
export function lowerExpression({ root, symbols }: Expression, { code, scope, owner }: Lowering): void {
  const lowering = { code, scope, owner };
  let value = lower(root, lowering);
  if (mayStepOver(root)) {
    const passedOn = passesOn(root);
    for (const name of symbols) if (!passedOn.has(name)) value = emit('needs', [value, scope.slotOf(name)], lowering);
  }
  const last = -value - 1;
  // The usual last operations settle the value as they write it: one step less for most quantities.
  const settling = value < 0 ? settlingCodes[code.codes[last] ?? -1] : undefined;
  if (settling !== undefined) code.codes[last] = settling;
  else if (value >= 0 || !isSettled(value, code)) emit('settle', [value], lowering);
  code.lastOps[owner] = code.codes.length - 1;
}

/** Operations that choose between settled values, or bring one nearer to zero, leave nothing to settle. */
const harmless = new Set([codeOf('least'), codeOf('most'), codeOf('absolute'), codeOf('root')]);
function isSettled(ref: number, code: LoweredCode): boolean {
  // A folded constant may be infinite.
  if (ref >= 0) return ref < code.slotCount || Number.isFinite(code.constantValues[ref - code.slotCount]);
  const at = -ref - 1;
  return harmless.has(code.codes[at] ?? -1) && isSettled(code.a[at] ?? -1, code) && isSettled(code.b[at] ?? -1, code);
}

/** For each operation, the one that does the same and settles the result; for each pair, the one that does both. */
const settlingCodes = kernels.map((_, code) => findCode(`${nameOf(code)}Last`));
const fusedCodes = kernels.map((_, first) =>
  kernels.map((__, second) =>
    findCode(`${nameOf(first)}${nameOf(second).replace(/^./, (letter) => letter.toUpperCase())}`),
  ),
);

/** Whether a formula has anything at all that can step over a missing value; most have not. */
const mayStepOver = (node: ExpressionNode): boolean =>
  node.kind === 'conditional' ||
  node.kind === 'lookup' ||
  (node.kind === 'arithmetic' && node.operator === '^') ||
  childrenOf(node).some(mayStepOver);

/**
 * The names whose missing value is sure to make the result missing. A case that is not chosen, a table and an exponent
 * of zero step over one; downstream of a problem nothing may show a number all the same, so those are asked for besides.
 */
function passesOn(node: ExpressionNode): ReadonlySet<string> {
  switch (node.kind) {
    case 'number':
    case 'lookup':
      return new Set();
    case 'symbol':
      return new Set([node.name]);
    case 'conditional': {
      const [yes, no] = [passesOn(node.whenTrue), passesOn(node.whenFalse)];
      return new Set([...passesOn(node.condition), ...[...yes].filter((name) => no.has(name))]);
    }
    case 'arithmetic':
      return node.operator === '^' ? passesOn(node.right) : allPassedOn(node);
    default:
      return allPassedOn(node);
  }
}
const allPassedOn = (node: ExpressionNode): ReadonlySet<string> =>
  new Set(childrenOf(node).flatMap((child) => [...passesOn(child)]));

type Operands = readonly [number] | readonly [number, number] | readonly [number, number, number];

function emit(operation: Operation, [a, b = a, c = a]: Operands, { code, owner }: Lowering): number {
  code.codes.push(codeOf(operation));
  code.a.push(a);
  code.b.push(b);
  code.c.push(c);
  code.owners.push(owner);
  return -code.codes.length;
}

type Pair = { left: number; right: number };

/** Emits an operation on two values: folded where both are constants, in one with the operation before where there is such a pair. */
function emitArithmetic(operator: ArithmeticOperator, { left, right }: Pair, lowering: Lowering): number {
  const { code } = lowering;
  const { operation, fold } = arithmetic[operator];
  const [a, b] = [left, right].map((ref) => (ref < 0 ? undefined : code.constantValues[ref - code.slotCount]));
  if (a !== undefined && b !== undefined) return constantRef(fold(a, b), code);
  // Only the operation just emitted may take another in: it belongs to this formula, and nothing else has its result.
  const before = -code.codes.length;
  const isLeft = left === before;
  const canSwap = right === before && (operator === '+' || operator === '*');
  const last = code.codes.length - 1;
  const fused = isLeft || canSwap ? fusedCodes[code.codes[last] ?? -1]?.[codeOf(operation)] : undefined;
  if (fused === undefined) return emit(operation, [left, right], lowering);
  code.codes[last] = fused;
  code.c[last] = isLeft ? right : left;
  return before;
}

/** Constants stand behind the slots, each once. */
function constantRef(value: number, { constants, constantValues, slotCount }: LoweredCode): number {
  const known = constants.get(value);
  if (known !== undefined) return known;
  const ref = slotCount + constants.size;
  constants.set(value, ref);
  constantValues.push(value);
  return ref;
}

function lower(node: ExpressionNode, lowering: Lowering): number {
  switch (node.kind) {
    case 'number':
      return constantRef(node.base, lowering.code);
    case 'symbol': {
      const slot = lowering.scope.slotOf(node.name);
      return slot < 0 ? constantRef(NaN, lowering.code) : slot;
    }
    case 'negative':
      return emit('negate', [lower(node.operand, lowering)], lowering);
    case 'arithmetic': {
      const left = lower(node.left, lowering);
      return emitArithmetic(node.operator, { left, right: lower(node.right, lowering) }, lowering);
    }
    case 'comparison':
      return emit('compare', [lower(node.left, lowering), lower(node.right, lowering), masks[node.operator]], lowering);
    case 'conditional': {
      const condition = lower(node.condition, lowering);
      return emit('choose', [condition, lower(node.whenTrue, lowering), lower(node.whenFalse, lowering)], lowering);
    }
    case 'call':
      return lowerCall(node, lowering);
    case 'lookup':
      return lowerLookup(node, lowering);
  }
}

type Arithmetic = { operation: Operation; fold: (a: number, b: number) => number };
const arithmetic: Readonly<Record<ArithmeticOperator, Arithmetic>> = {
  '+': { operation: 'add', fold: (a, b) => a + b },
  '-': { operation: 'subtract', fold: (a, b) => a - b },
  '*': { operation: 'multiply', fold: (a, b) => a * b },
  '/': { operation: 'divide', fold: (a, b) => a / b },
  '^': { operation: 'power', fold: (a, b) => a ** b },
};
const masks: Readonly<Record<ComparisonOperator, number>> = { '<': 1, '<=': 3, '>': 4, '>=': 6, '==': 2, '!=': 5 };
const calls: Readonly<Record<string, { operation: Operation; form: 'fold' | 'step' | 'single' }>> = {
  min: { operation: 'least', form: 'fold' },
  max: { operation: 'most', form: 'fold' },
  round: { operation: 'round', form: 'step' },
  floor: { operation: 'floor', form: 'step' },
  ceil: { operation: 'ceil', form: 'step' },
  abs: { operation: 'absolute', form: 'single' },
  sqrt: { operation: 'root', form: 'single' },
  log10: { operation: 'log', form: 'single' },
};

function lowerCall({ name, args }: NodeOf<'call'>, lowering: Lowering): number {
  const call = calls[name];
  const [first, ...others] = args.map((each) => lower(each, lowering));
  if (call === undefined || first === undefined) return constantRef(NaN, lowering.code);
  if (call.form === 'single') return emit(call.operation, [first], lowering);
  if (call.form === 'step') return emit(call.operation, [first, others[0] ?? constantRef(1, lowering.code)], lowering);
  return others.reduce((value, each) => emit(call.operation, [value, each], lowering), first);
}

function lowerLookup({ table, column, key }: NodeOf<'lookup'>, lowering: Lowering): number {
  const { code, scope } = lowering;
  const found = scope.findTable(table)?.columns.get(column);
  const keyRef = lower(key, lowering);
  if (found === undefined) return constantRef(NaN, code);
  let place = code.columnRefs.get(found);
  if (place === undefined) {
    place = code.columns.length;
    code.columns.push(found);
    code.columnRefs.set(found, place);
  }
  return emit('lookUp', [keyRef, place], lowering);
}
