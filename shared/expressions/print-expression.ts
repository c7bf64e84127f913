import type { ExpressionNode } from './tree.ts';

/** Writes a tree back as a formula; brackets only where the meaning needs them. Reading it again gives the same tree. */
export const printExpression = (node: ExpressionNode): string => print(node).text;

/** How tightly a form holds together; a part looser than its place asks for gets brackets. */
const strength = {
  conditional: 0,
  comparison: 1,
  '+': 2,
  '-': 2,
  '*': 3,
  '/': 3,
  negative: 4,
  '^': 5,
  whole: 6,
} as const;
type Printed = { text: string; strength: number };

function print(node: ExpressionNode): Printed {
  switch (node.kind) {
    case 'number':
      return {
        text: node.unit === '' ? node.decimalText : `${node.decimalText} ${node.unit}`,
        strength: node.unit === '' ? strength.whole : strength['*'],
      };
    case 'symbol':
      return { text: node.name, strength: strength.whole };
    case 'negative':
      return { text: `-${inside(node.operand, strength['^'])}`, strength: strength.negative };
    case 'comparison':
      return {
        text: `${inside(node.left, strength['+'])} ${node.operator} ${inside(node.right, strength['+'])}`,
        strength: strength.comparison,
      };
    case 'arithmetic':
      return printArithmetic(node);
    case 'conditional':
      return {
        text: `${inside(node.condition, strength.comparison)} ? ${inside(node.whenTrue, strength['+'])} : ${inside(node.whenFalse, strength['+'])}`,
        strength: strength.conditional,
      };
    case 'call':
      return { text: `${node.name}(${node.args.map(printExpression).join(', ')})`, strength: strength.whole };
    case 'lookup':
      return {
        text: `lookup("${node.table}", ${printExpression(node.key)}, "${node.column}")`,
        strength: strength.whole,
      };
  }
}

function printArithmetic({ operator, left, right }: Extract<ExpressionNode, { kind: 'arithmetic' }>): Printed {
  const own = strength[operator];
  if (operator === '^')
    return { text: `${inside(left, strength.whole)}^${inside(right, strength.whole)}`, strength: own };
  return { text: `${inside(left, own)} ${operator} ${inside(right, own + 1)}`, strength: own };
}

function inside(node: ExpressionNode, needed: number): string {
  const printed = print(node);
  return printed.strength < needed ? `(${printed.text})` : printed.text;
}
