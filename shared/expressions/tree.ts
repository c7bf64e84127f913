/** A formula as a tree of a closed list of nodes; everything that mathjs can parse beyond it is refused. */

/** Columns in the formula's text: `start` counts from 0, `end` is the first column after. Messages count from 1. */
export type Place = { start: number; end: number };

export type ComparisonOperator = '<' | '<=' | '>' | '>=' | '==' | '!=';
export type ArithmeticOperator = '+' | '-' | '*' | '/' | '^';

export type ExpressionNode =
  /** `base` is in base units; `unit` is the unit as written, '' for a plain number. */
  | { kind: 'number'; base: number; decimalText: string; unit: string; place: Place }
  | { kind: 'symbol'; name: string; place: Place }
  | { kind: 'negative'; operand: ExpressionNode; place: Place }
  | { kind: 'arithmetic'; operator: ArithmeticOperator; left: ExpressionNode; right: ExpressionNode; place: Place }
  | { kind: 'comparison'; operator: ComparisonOperator; left: ExpressionNode; right: ExpressionNode; place: Place }
  | {
      kind: 'conditional';
      condition: ExpressionNode;
      whenTrue: ExpressionNode;
      whenFalse: ExpressionNode;
      place: Place;
    }
  | { kind: 'call'; name: string; args: ExpressionNode[]; place: Place }
  | { kind: 'lookup'; table: string; key: ExpressionNode; column: string; place: Place };

export type Expression = {
  text: string;
  root: ExpressionNode;
  /** Names of quantities, each once, in order of appearance. */
  symbols: string[];
};

export type ExpressionProblem = {
  code:
    | 'syntax'
    | 'not-allowed'
    | 'unknown-symbol'
    | 'unknown-function'
    | 'unknown-unit'
    | 'wrong-arguments'
    | 'unit-mismatch'
    | 'unknown-table'
    | 'unknown-column'
    | 'too-long';
  /** Names the place and the remedy. */
  message: string;
  start: number;
  end: number;
};

export const problemAt = (code: ExpressionProblem['code'], place: Place, message: string): ExpressionProblem => ({
  code,
  message: `${message} (${columns(place)})`,
  ...place,
});

const columns = ({ start, end }: Place): string =>
  end - start <= 1 ? `column ${start + 1}` : `columns ${start + 1} to ${end}`;

export const spanOf = (from: Place, to: Place): Place => ({
  start: Math.min(from.start, to.start),
  end: Math.max(from.end, to.end),
});

/** The parts of a node, in the order of the text. */
export function childrenOf(node: ExpressionNode): ExpressionNode[] {
  switch (node.kind) {
    case 'number':
    case 'symbol':
      return [];
    case 'negative':
      return [node.operand];
    case 'arithmetic':
    case 'comparison':
      return [node.left, node.right];
    case 'conditional':
      return [node.condition, node.whenTrue, node.whenFalse];
    case 'call':
      return node.args;
    case 'lookup':
      return [node.key];
  }
}
