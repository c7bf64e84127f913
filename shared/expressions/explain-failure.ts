import { compileNode } from './compile-expression.ts';
import type { ExpressionScope } from './scope.ts';
import { childrenOf, type Expression, type ExpressionNode, type Place } from './tree.ts';

export type Failure = {
  code: 'division-by-zero' | 'not-in-table' | 'root-of-negative' | 'not-finite';
  message: string;
  place: Place;
};

/** Finds the innermost part that has no finite value. Slow on purpose: it runs only after a formula has failed. */
export function explainFailure(
  expression: Expression,
  scope: ExpressionScope,
  slots: Float64Array,
): Failure | undefined {
  const valueOf = (node: ExpressionNode): number => compileNode(node, scope)(slots);
  const search = (node: ExpressionNode): Failure | undefined => {
    if (Number.isFinite(valueOf(node))) return undefined;
    for (const part of partsInUse(node, valueOf)) {
      const found = search(part);
      if (found !== undefined) return found;
    }
    return describe({ node, valueOf, scope }, expression.text);
  };
  return search(expression.root);
}

/** Only the chosen case of a conditional counts. */
function partsInUse(node: ExpressionNode, valueOf: (node: ExpressionNode) => number): ExpressionNode[] {
  if (node.kind !== 'conditional') return childrenOf(node);
  const holds = valueOf(node.condition);
  if (Number.isNaN(holds)) return [node.condition];
  return [holds === 1 ? node.whenTrue : node.whenFalse];
}

type Failed = { node: ExpressionNode; valueOf: (node: ExpressionNode) => number; scope: ExpressionScope };

function describe({ node, valueOf, scope }: Failed, text: string): Failure {
  const written = text.slice(node.place.start, node.place.end);
  const { place } = node;
  if (node.kind === 'arithmetic' && node.operator === '/' && valueOf(node.right) === 0) {
    return {
      code: 'division-by-zero',
      message: `${text.slice(node.right.place.start, node.right.place.end)} is zero, so "${written}" divides by zero.`,
      place,
    };
  }
  if (node.kind === 'lookup') {
    return {
      code: 'not-in-table',
      message: scope.findTable(node.table)?.explainMiss(valueOf(node.key)) ?? `There is no table "${node.table}".`,
      place,
    };
  }
  if (node.kind === 'call' && node.name === 'sqrt') {
    return { code: 'root-of-negative', message: `"${written}" takes the root of a negative value.`, place };
  }
  return { code: 'not-finite', message: `"${written}" has no finite value.`, place };
}
