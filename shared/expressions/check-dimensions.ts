import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { dimensionOf, findUnit } from '#shared/units/definitions.ts';
import {
  addDimensions,
  describeDimension,
  divideDimensions,
  isPlain,
  isSameDimension,
  multiplyDimensions,
  plainNumber,
  raiseDimension,
  type Dimension,
} from '#shared/units/dimensions.ts';
import { findFunction } from './functions.ts';
import type { ExpressionScope } from './scope.ts';
import { problemAt, type Expression, type ExpressionNode, type ExpressionProblem } from './tree.ts';

type Checked = Result<Dimension, ExpressionProblem>;
type NodeOf<Kind extends ExpressionNode['kind']> = Extract<ExpressionNode, { kind: Kind }>;

/** The dimension that a formula yields, found once, before anything is computed. */
export function checkDimensions(expression: Expression, scope: ExpressionScope): Checked {
  return check(expression.root, scope);
}

function check(node: ExpressionNode, scope: ExpressionScope): Checked {
  switch (node.kind) {
    case 'number':
      return checkNumber(node);
    case 'symbol':
      return checkSymbol(node, scope);
    case 'negative':
      return check(node.operand, scope);
    case 'arithmetic':
      return checkArithmetic(node, scope);
    case 'comparison':
      return fail(
        problemAt(
          'unit-mismatch',
          node.place,
          'A comparison is not a value. Use it before ? and give a value for each case',
        ),
      );
    case 'conditional':
      return checkConditional(node, scope);
    case 'call':
      return checkCall(node, scope);
    case 'lookup':
      return checkLookup(node, scope);
  }
}

function checkNumber(node: NodeOf<'number'>): Checked {
  const unit = findUnit(node.unit);
  return unit.ok ? succeed(dimensionOf(unit.value)) : fail(problemAt('unknown-unit', node.place, unit.error.message));
}

function checkSymbol(node: NodeOf<'symbol'>, scope: ExpressionScope): Checked {
  const dimension = scope.dimensionOf(node.name);
  if (dimension !== undefined) return succeed(dimension);
  return fail(
    problemAt('unknown-symbol', node.place, `There is no quantity "${node.name}". Check the spelling or define it`),
  );
}

function checkBoth(
  node: { left: ExpressionNode; right: ExpressionNode },
  scope: ExpressionScope,
): Result<[Dimension, Dimension], ExpressionProblem> {
  const left = check(node.left, scope);
  if (!left.ok) return left;
  const right = check(node.right, scope);
  if (!right.ok) return right;
  return succeed([left.value, right.value]);
}

function checkArithmetic(node: NodeOf<'arithmetic'>, scope: ExpressionScope): Checked {
  const both = checkBoth(node, scope);
  if (!both.ok) return both;
  const [left, right] = both.value;
  switch (node.operator) {
    case '*':
      return succeed(multiplyDimensions(left, right));
    case '/':
      return succeed(divideDimensions(left, right));
    case '^':
      return checkPower(node, left, right);
    case '+':
    case '-': {
      const sum = addDimensions(left, right, node.operator);
      if (sum !== undefined) return succeed(sum);
      const word = node.operator === '+' ? 'added to' : 'subtracted from';
      const [from, to] = node.operator === '+' ? [left, right] : [right, left];
      return fail(
        problemAt(
          'unit-mismatch',
          node.place,
          `A ${describeDimension(from)} cannot be ${word} a ${describeDimension(to)}.${unitHint(left, right)}`,
        ),
      );
    }
  }
}

const unitHint = (left: Dimension, right: Dimension): string =>
  isPlain(left) !== isPlain(right) ? ' Write the unit behind the number, as in 10.7 MHz' : ' Check the units of both';

function checkPower(node: NodeOf<'arithmetic'>, base: Dimension, exponent: Dimension): Checked {
  if (!isPlain(exponent))
    return fail(problemAt('unit-mismatch', node.right.place, 'An exponent must be a plain number'));
  if (isPlain(base)) return succeed(plainNumber);
  const power = constantOf(node.right);
  if (power !== undefined) return succeed(raiseDimension(base, power));
  return fail(
    problemAt(
      'unit-mismatch',
      node.right.place,
      `The exponent of a ${describeDimension(base)} must be a number, not a formula, so that the unit is known`,
    ),
  );
}

function constantOf(node: ExpressionNode): number | undefined {
  if (node.kind === 'number') return node.base;
  if (node.kind === 'negative') {
    const inner = constantOf(node.operand);
    return inner === undefined ? undefined : -inner;
  }
  if (node.kind !== 'arithmetic' || node.operator !== '/') return undefined;
  const [over, under] = [constantOf(node.left), constantOf(node.right)];
  return over === undefined || under === undefined || under === 0 ? undefined : over / under;
}

function checkConditional(node: NodeOf<'conditional'>, scope: ExpressionScope): Checked {
  const { condition } = node;
  if (condition.kind !== 'comparison')
    return fail(problemAt('syntax', condition.place, 'Before ? stands a comparison, as in channel > 28 ? 1 : 2'));
  const compared = checkBoth(condition, scope);
  if (!compared.ok) return compared;
  if (!isSameDimension(...compared.value)) {
    const [left, right] = compared.value.map(describeDimension);
    return fail(
      problemAt(
        'unit-mismatch',
        condition.place,
        `A ${left} cannot be compared with a ${right}.${unitHint(...compared.value)}`,
      ),
    );
  }
  const cases = checkBoth({ left: node.whenTrue, right: node.whenFalse }, scope);
  if (!cases.ok) return cases;
  if (isSameDimension(...cases.value)) return succeed(cases.value[0]);
  const [yes, no] = cases.value.map(describeDimension);
  return fail(
    problemAt('unit-mismatch', node.place, `One case gives a ${yes}, the other a ${no}.${unitHint(...cases.value)}`),
  );
}

function checkCall(node: NodeOf<'call'>, scope: ExpressionScope): Checked {
  const args: Dimension[] = [];
  for (const each of node.args) {
    const checked = check(each, scope);
    if (!checked.ok) return checked;
    args.push(checked.value);
  }
  const first = args[0] ?? plainNumber;
  const odd = args.findIndex((each) => !isSameDimension(each, first));
  const oddPlace = node.args[odd]?.place;
  if (oddPlace !== undefined) {
    return fail(
      problemAt(
        'unit-mismatch',
        oddPlace,
        `${node.name} needs values of one kind: this is a ${describeDimension(args[odd] ?? plainNumber)}, the first a ${describeDimension(first)}`,
      ),
    );
  }
  return checkRule(node, first);
}

/** The first argument against the function's rule; all others have its dimension by now. */
function checkRule(node: NodeOf<'call'>, first: Dimension): Checked {
  const rule = findFunction(node.name)?.unitRule;
  if (rule === 'root') return succeed(raiseDimension(first, 0.5));
  if (isPlain(first)) return succeed(first);
  const { name, place } = node;
  const kind = describeDimension(first);
  if (rule === 'plain') {
    const remedy = 'Divide by a unit first, as in log10(power / (1 mW))';
    return fail(problemAt('unit-mismatch', place, `${name} takes a plain number, not a ${kind}. ${remedy}`));
  }
  if (rule === 'step' && node.args.length === 1)
    return fail(problemAt('unit-mismatch', place, `To ${name} a ${kind}, say to which step, as in ${name}(x, 1 kHz)`));
  return succeed(first);
}

function checkLookup(node: NodeOf<'lookup'>, scope: ExpressionScope): Checked {
  const table = scope.findTable(node.table);
  if (table === undefined)
    return fail(problemAt('unknown-table', node.place, `There is no table "${node.table}". Check the name`));
  const column = table.columns.get(node.column);
  if (column === undefined) {
    return fail(
      problemAt(
        'unknown-column',
        node.place,
        `The table "${node.table}" has no column "${node.column}". It has ${[...table.columns.keys()].join(', ')}`,
      ),
    );
  }
  const key = check(node.key, scope);
  if (!key.ok) return key;
  if (isSameDimension(key.value, table.keyDimension)) return succeed(column.dimension);
  return fail(
    problemAt(
      'unit-mismatch',
      node.key.place,
      `The key of "${node.table}" is a ${describeDimension(table.keyDimension)}, this is a ${describeDimension(key.value)}`,
    ),
  );
}
