import type { Program } from '#shared/calc/program.ts';
import { childrenOf, type ExpressionNode, type Place } from '#shared/expressions/tree.ts';

/** The expression of a quantity with a text in the place of each symbol: `156.800 mc - 10.700 mc`. Undefined without one. */
export function filledIn(program: Program, symbol: string, textOf: (symbol: string) => string): string | undefined {
  const expression = program.cells[program.slots.get(symbol) ?? -1]?.formula?.expression;
  if (expression === undefined) return undefined;
  const places: (Place & { name: string })[] = [];
  const visit = (node: ExpressionNode): void => {
    if (node.kind === 'symbol') places.push({ ...node.place, name: node.name });
    childrenOf(node).forEach(visit);
  };
  visit(expression.root);
  // From the end, so that the earlier places stay where they are.
  return places
    .sort((a, b) => b.start - a.start)
    .reduce(
      (text, { start, end, name }) => `${text.slice(0, start)}${textOf(name)}${text.slice(end)}`,
      expression.text,
    );
}
