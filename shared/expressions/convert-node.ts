import type {
  ConditionalNode,
  ConstantNode,
  FunctionNode,
  MathNode,
  OperatorNode,
  ParenthesisNode,
  SymbolNode,
} from 'mathjs';
import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { toBase } from '#shared/units/convert.ts';
import { canonicalLetters, findUnit, plainUnit } from '#shared/units/definitions.ts';
import { findFunction, namedNumbers } from './functions.ts';
import type { Leaf } from './tokens.ts';
import {
  problemAt,
  spanOf,
  type ArithmeticOperator,
  type ComparisonOperator,
  type ExpressionNode,
  type ExpressionProblem,
  type Place,
} from './tree.ts';

/** Where the walk through mathjs's tree stands: `next` is the first leaf not yet met. */
export type Conversion = { text: string; leaves: readonly Leaf[]; next: number };
type Converted = Result<ExpressionNode, ExpressionProblem>;

/** Turns one of mathjs's nodes into ours, or refuses it. Must be called in the order of the text. */
export function convertNode(node: MathNode, conversion: Conversion): Converted {
  const convert = converters[node.type];
  if (convert !== undefined) return convert(node, conversion);
  return fail(
    problemAt(
      'not-allowed',
      restOf(conversion),
      'This kind of expression is not part of formulas. Use numbers, names, + - * / ^, one comparison, ? : and functions',
    ),
  );
}

/** Written as a method so that each converter may name the class it handles; `type` has chosen it by then. */
type Converter = { convert(node: MathNode, conversion: Conversion): Converted }['convert'];

const converters: Readonly<Record<string, Converter>> = {
  ConstantNode: convertConstant,
  SymbolNode: convertSymbol,
  ParenthesisNode: (node: ParenthesisNode, conversion: Conversion) => convertNode(node.content, conversion),
  OperatorNode: convertOperator,
  ConditionalNode: convertConditional,
  FunctionNode: convertFunction,
};

const restOf = ({ leaves, next, text }: Conversion): Place => ({ start: leaves[next]?.start ?? 0, end: text.length });

function take(conversion: Conversion): Leaf {
  const leaf = conversion.leaves[conversion.next] ?? { kind: 'name' as const, text: '', ...restOf(conversion) };
  conversion.next += 1;
  return leaf;
}
const placeOf = ({ start, end }: Leaf): Place => ({ start, end });

function convertConstant(_: ConstantNode, conversion: Conversion): Converted {
  const leaf = take(conversion);
  // The text of the number, not mathjs's double: 10.7 MHz must become 10700000 Hz exactly.
  if (leaf.kind === 'number')
    return succeed({
      kind: 'number',
      base: toBase(leaf.text, plainUnit),
      decimalText: leaf.text,
      unit: '',
      place: placeOf(leaf),
    });
  return fail(
    problemAt(
      'not-allowed',
      leaf,
      `${leaf.text} cannot stand here. Text belongs in lookup("table", key, "column") only`,
    ),
  );
}

function convertSymbol(_: SymbolNode, conversion: Conversion): Converted {
  const leaf = take(conversion);
  const place = placeOf(leaf);
  const named = namedNumbers.get(leaf.text);
  if (named !== undefined) return succeed({ kind: 'number', base: named, decimalText: leaf.text, unit: '', place });
  if (findUnit(leaf.text).ok)
    return fail(problemAt('syntax', place, `The unit "${leaf.text}" needs a number before it: 1 ${leaf.text}`));
  return succeed({ kind: 'symbol', name: leaf.text, place });
}

const arithmetic: Readonly<Record<string, ArithmeticOperator>> = {
  add: '+',
  subtract: '-',
  multiply: '*',
  divide: '/',
  pow: '^',
};
const comparisons: Readonly<Record<string, ComparisonOperator>> = {
  smaller: '<',
  smallerEq: '<=',
  larger: '>',
  largerEq: '>=',
  equal: '==',
  unequal: '!=',
};

function convertOperator(node: OperatorNode, conversion: Conversion): Converted {
  const name: string = node.fn;
  const [first, second] = node.args;
  if (first === undefined) return fail(problemAt('syntax', restOf(conversion), 'An operator has nothing to work on'));
  if (second === undefined) return convertSign(name, first, conversion);
  if (node.implicit) return convertWithUnit(first, second, conversion);
  const left = convertNode(first, conversion);
  if (!left.ok) return left;
  const right = convertNode(second, conversion);
  if (!right.ok) return right;
  const parts = { left: left.value, right: right.value, place: spanOf(left.value.place, right.value.place) };
  const operator = arithmetic[name];
  if (operator !== undefined) return succeed({ kind: 'arithmetic', operator, ...parts });
  const comparison = comparisons[name];
  if (comparison !== undefined) return succeed({ kind: 'comparison', operator: comparison, ...parts });
  return fail(
    problemAt(
      'not-allowed',
      parts.place,
      `"${String(node.op)}" is not part of formulas. Use + - * / ^ or a comparison`,
    ),
  );
}

function convertSign(name: string, operand: MathNode, conversion: Conversion): Converted {
  const converted = convertNode(operand, conversion);
  if (!converted.ok || name === 'unaryPlus') return converted;
  const { place } = converted.value;
  // One column for the sign itself; blanks between are rare and harmless.
  if (name === 'unaryMinus')
    return succeed({
      kind: 'negative',
      operand: converted.value,
      place: { start: Math.max(0, place.start - 1), end: place.end },
    });
  return fail(problemAt('not-allowed', place, 'This sign is not part of formulas. Use + - * / ^'));
}

/** Side by side without a sign: a number and its unit, and nothing else. */
function convertWithUnit(first: MathNode, second: MathNode, conversion: Conversion): Converted {
  const number = convertNode(first, conversion);
  if (!number.ok) return number;
  const leaf = conversion.leaves[conversion.next];
  const bare = number.value.kind === 'negative' ? number.value.operand : number.value;
  if (
    leaf === undefined ||
    second.type !== 'SymbolNode' ||
    bare.kind !== 'number' ||
    bare.unit !== '' ||
    namedNumbers.has(bare.decimalText)
  ) {
    const place = spanOf(number.value.place, leaf ?? number.value.place);
    return fail(
      problemAt(
        'syntax',
        place,
        'There is no sign between these. Write * to multiply; only a number and its unit stand side by side, as in 2 * (1 MHz)',
      ),
    );
  }
  conversion.next += 1;
  const unit = findUnit(leaf.text);
  if (!unit.ok)
    return fail(problemAt('unknown-unit', leaf, `${unit.error.message} If it is a name, write * before it`));
  const place = spanOf(bare.place, leaf);
  const withUnit: ExpressionNode = {
    kind: 'number',
    base: toBase(bare.decimalText, unit.value),
    decimalText: bare.decimalText,
    unit: canonicalLetters(leaf.text),
    place,
  };
  return succeed(
    number.value.kind === 'negative'
      ? { ...number.value, operand: withUnit, place: spanOf(number.value.place, place) }
      : withUnit,
  );
}

function convertConditional(node: ConditionalNode, conversion: Conversion): Converted {
  const condition = convertNode(node.condition, conversion);
  if (!condition.ok) return condition;
  const whenTrue = convertNode(node.trueExpr, conversion);
  if (!whenTrue.ok) return whenTrue;
  const whenFalse = convertNode(node.falseExpr, conversion);
  if (!whenFalse.ok) return whenFalse;
  const place = spanOf(condition.value.place, whenFalse.value.place);
  return succeed({
    kind: 'conditional',
    condition: condition.value,
    whenTrue: whenTrue.value,
    whenFalse: whenFalse.value,
    place,
  });
}

function convertFunction(node: FunctionNode, conversion: Conversion): Converted {
  const name = take(conversion);
  if (name.text === 'lookup') return convertLookup(node, name, conversion);
  const definition = findFunction(name.text);
  if (definition === undefined)
    return fail(
      problemAt(
        'unknown-function',
        name,
        `There is no function "${name.text}". To multiply, write * before the bracket`,
      ),
    );
  const args: ExpressionNode[] = [];
  for (const each of node.args) {
    const converted = convertNode(each, conversion);
    if (!converted.ok) return converted;
    args.push(converted.value);
  }
  const place = spanOf(name, args.at(-1)?.place ?? name);
  const { least, most } = definition.arity;
  if (args.length >= least && args.length <= most) return succeed({ kind: 'call', name: name.text, args, place });
  const wanted = least === most ? `${least}` : `${least} to ${most}`;
  return fail(
    problemAt(
      'wrong-arguments',
      place,
      `${name.text} takes ${wanted} values, not ${args.length}, as in ${definition.example.text}`,
    ),
  );
}

function convertLookup(node: FunctionNode, name: Leaf, conversion: Conversion): Converted {
  const wrong = () =>
    fail(
      problemAt('wrong-arguments', name, 'Write lookup("table", key, "column") with table and column in double quotes'),
    );
  const keyNode = node.args[1];
  if (node.args.length !== 3 || keyNode === undefined) return wrong();
  const table = take(conversion);
  if (table.kind !== 'text') return wrong();
  const key = convertNode(keyNode, conversion);
  if (!key.ok) return key;
  const column = take(conversion);
  if (column.kind !== 'text') return wrong();
  const unquoted = (leaf: Leaf) => leaf.text.slice(1, -1);
  return succeed({
    kind: 'lookup',
    table: unquoted(table),
    key: key.value,
    column: unquoted(column),
    place: spanOf(name, column),
  });
}
