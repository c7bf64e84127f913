import { compileNode } from './compile-expression.ts';
import { findFunction } from './functions.ts';
import type { ExpressionScope } from './scope.ts';
import type { Expression, ExpressionNode } from './tree.ts';

/** The slope of a formula when the slots move along `slopes`: forward differentiation, exact but for rounding. */
export type CompiledDerivative = (slots: Float64Array, slopes: Float64Array) => number;
type NodeOf<Kind extends ExpressionNode['kind']> = Extract<ExpressionNode, { kind: Kind }>;

export const compileDerivative = (expression: Expression, scope: ExpressionScope): CompiledDerivative =>
  derive(expression.root, scope);

function derive(node: ExpressionNode, scope: ExpressionScope): CompiledDerivative {
  switch (node.kind) {
    case 'number':
    case 'comparison':
    // A table has no slope between its rows.
    case 'lookup':
      return () => 0;
    case 'symbol': {
      const slot = scope.slotOf(node.name);
      return (_, slopes) => slopes[slot] ?? 0;
    }
    case 'negative': {
      const operand = derive(node.operand, scope);
      return (slots, slopes) => -operand(slots, slopes);
    }
    case 'arithmetic':
      return deriveArithmetic(node, scope);
    case 'conditional': {
      const condition = compileNode(node.condition, scope);
      const [whenTrue, whenFalse] = [derive(node.whenTrue, scope), derive(node.whenFalse, scope)];
      return (slots, slopes) => (condition(slots) === 1 ? whenTrue : whenFalse)(slots, slopes);
    }
    case 'call': {
      const definition = findFunction(node.name);
      const args = node.args.map((each) => compileNode(each, scope));
      const inner = node.args.map((each) => derive(each, scope));
      return (slots, slopes) =>
        definition?.derivative(
          args.map((each) => each(slots)),
          inner.map((each) => each(slots, slopes)),
        ) ?? NaN;
    }
  }
}

function deriveArithmetic(node: NodeOf<'arithmetic'>, scope: ExpressionScope): CompiledDerivative {
  const [left, right] = [compileNode(node.left, scope), compileNode(node.right, scope)];
  const [leftSlope, rightSlope] = [derive(node.left, scope), derive(node.right, scope)];
  switch (node.operator) {
    case '+':
      return (slots, slopes) => leftSlope(slots, slopes) + rightSlope(slots, slopes);
    case '-':
      return (slots, slopes) => leftSlope(slots, slopes) - rightSlope(slots, slopes);
    case '*':
      return (slots, slopes) => leftSlope(slots, slopes) * right(slots) + left(slots) * rightSlope(slots, slopes);
    case '/':
      return (slots, slopes) => {
        const under = right(slots);
        return (leftSlope(slots, slopes) - (left(slots) / under) * rightSlope(slots, slopes)) / under;
      };
    case '^':
      return (slots, slopes) => {
        const [base, exponent] = [left(slots), right(slots)];
        const [baseSlope, exponentSlope] = [leftSlope(slots, slopes), rightSlope(slots, slopes)];
        // Each half only where something moves: 0^0 and log(negative) must not spoil a slope that is zero.
        const throughBase = baseSlope === 0 ? 0 : exponent * base ** (exponent - 1) * baseSlope;
        const throughExponent = exponentSlope === 0 ? 0 : base ** exponent * Math.log(base) * exponentSlope;
        return throughBase + throughExponent;
      };
  }
}
