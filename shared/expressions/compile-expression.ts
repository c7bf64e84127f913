import { findFunction } from './functions.ts';
import type { ExpressionScope } from './scope.ts';
import type { ArithmeticOperator, ComparisonOperator, Expression, ExpressionNode } from './tree.ts';

/** Computes from base-unit values in slots. NaN or an infinity means that explainFailure knows more. */
export type Compiled = (slots: Float64Array) => number;
type NodeOf<Kind extends ExpressionNode['kind']> = Extract<ExpressionNode, { kind: Kind }>;

export const compileExpression = (expression: Expression, scope: ExpressionScope): Compiled =>
  compileNode(expression.root, scope);

export function compileNode(node: ExpressionNode, scope: ExpressionScope): Compiled {
  switch (node.kind) {
    case 'number': {
      const { base } = node;
      return () => base;
    }
    case 'symbol': {
      const slot = scope.slotOf(node.name);
      return (slots) => slots[slot] ?? NaN;
    }
    case 'negative': {
      const operand = compileNode(node.operand, scope);
      return (slots) => -operand(slots);
    }
    case 'arithmetic':
      return arithmetic[node.operator](compileNode(node.left, scope), compileNode(node.right, scope));
    case 'comparison':
      return comparisons[node.operator](compileNode(node.left, scope), compileNode(node.right, scope));
    case 'conditional':
      return compileConditional(node, scope);
    case 'call':
      return compileCall(node, scope);
    case 'lookup': {
      const key = compileNode(node.key, scope);
      const column = scope.findTable(node.table)?.columns.get(node.column);
      return column === undefined ? () => NaN : (slots) => column.read(key(slots));
    }
  }
}

type Joined = (left: Compiled, right: Compiled) => Compiled;
const arithmetic: Readonly<Record<ArithmeticOperator, Joined>> = {
  '+': (left, right) => (slots) => left(slots) + right(slots),
  '-': (left, right) => (slots) => left(slots) - right(slots),
  '*': (left, right) => (slots) => left(slots) * right(slots),
  '/': (left, right) => (slots) => left(slots) / right(slots),
  '^': (left, right) => (slots) => left(slots) ** right(slots),
};

/** Two doubles this near, relative to their size, are one printed value: 0.1 + 0.2 == 0.3 must hold on a bench. */
const sameWithin = 1e-12;
export const isAbout = (a: number, b: number): boolean => {
  if (a === b) return true;
  const gap = Math.abs(a - b);
  // An infinity is about nothing but itself.
  return gap < Infinity && gap <= sameWithin * Math.max(Math.abs(a), Math.abs(b));
};
const truth = (holds: boolean): number => (holds ? 1 : 0);
const comparisons: Readonly<Record<ComparisonOperator, Joined>> = {
  '<': (left, right) => (slots) => compare(left(slots), right(slots), (a, b) => a < b && !isAbout(a, b)),
  '<=': (left, right) => (slots) => compare(left(slots), right(slots), (a, b) => a < b || isAbout(a, b)),
  '>': (left, right) => (slots) => compare(left(slots), right(slots), (a, b) => a > b && !isAbout(a, b)),
  '>=': (left, right) => (slots) => compare(left(slots), right(slots), (a, b) => a > b || isAbout(a, b)),
  '==': (left, right) => (slots) => compare(left(slots), right(slots), isAbout),
  '!=': (left, right) => (slots) => compare(left(slots), right(slots), (a, b) => !isAbout(a, b)),
};
/** A comparison with a missing value has no answer; it must not choose the second case. */
const compare = (a: number, b: number, holds: (a: number, b: number) => boolean): number =>
  Number.isNaN(a) || Number.isNaN(b) ? NaN : truth(holds(a, b));

function compileConditional(node: NodeOf<'conditional'>, scope: ExpressionScope): Compiled {
  const condition = compileNode(node.condition, scope);
  const whenTrue = compileNode(node.whenTrue, scope);
  const whenFalse = compileNode(node.whenFalse, scope);
  return (slots) => {
    const holds = condition(slots);
    if (Number.isNaN(holds)) return NaN;
    return holds === 1 ? whenTrue(slots) : whenFalse(slots);
  };
}

function compileCall(node: NodeOf<'call'>, scope: ExpressionScope): Compiled {
  const definition = findFunction(node.name);
  if (definition === undefined) return () => NaN;
  const args = node.args.map((each) => compileNode(each, scope));
  return (slots) => definition.compute(args.map((each) => each(slots)));
}
