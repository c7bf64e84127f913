import { checkDimensions } from '#shared/expressions/check-dimensions.ts';
import { symbolObjection } from '#shared/expressions/names.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import type { ExpressionScope } from '#shared/expressions/scope.ts';
import type { Expression, ExpressionProblem } from '#shared/expressions/tree.ts';
import { dimensionOf, findUnit, plainUnit, type UnitDefinition } from '#shared/units/definitions.ts';
import { describeDimension, isSameDimension, type Dimension } from '#shared/units/dimensions.ts';
import type { CalcProblem, CalcProblemCode } from './problem.ts';
import type { QuantityDefinition } from './quantity.ts';
import { readValue } from './read-value.ts';

/** A definition after reading: units found, expression parsed and checked, home in base units. */
export type Prepared = {
  definition: QuantityDefinition;
  unit: UnitDefinition;
  home: number | undefined;
  dependsOn: readonly number[];
  expression?: Expression;
  problem?: CalcProblem;
  /** Only the home is missing or wrong: an input still works once a value is set. */
  homeProblem?: CalcProblem;
};

export function dimensionsOf(definitions: readonly QuantityDefinition[]): Map<string, Dimension> {
  const dimensions = new Map<string, Dimension>();
  for (const { symbol, unit } of definitions) {
    const found = findUnit(unit);
    if (found.ok && !dimensions.has(symbol)) dimensions.set(symbol, dimensionOf(found.value));
  }
  return dimensions;
}

export function prepareQuantities(definitions: readonly QuantityDefinition[], scope: ExpressionScope): Prepared[] {
  const seen = new Map<string, number>();
  for (const { symbol } of definitions) seen.set(symbol, (seen.get(symbol) ?? 0) + 1);
  return definitions.map((definition) => {
    const prepared = prepareOne(definition, scope);
    const { symbol } = definition;
    if ((seen.get(symbol) ?? 0) < 2) return prepared;
    // Neither of two can be trusted to be the one that was meant.
    return {
      ...prepared,
      problem: {
        code: 'duplicate-symbol',
        symbol,
        message: `Two quantities are called ${symbol}. Rename one of them.`,
      },
    };
  });
}

function prepareOne(definition: QuantityDefinition, scope: ExpressionScope): Prepared {
  const { symbol } = definition;
  const unit = findUnit(definition.unit);
  const bare: Prepared = { definition, unit: unit.ok ? unit.value : plainUnit, home: undefined, dependsOn: [] };
  const objection = symbolObjection(symbol);
  if (objection !== undefined) return { ...bare, problem: { code: 'bad-symbol', symbol, message: objection } };
  if (!unit.ok) return { ...bare, problem: { code: 'bad-unit', symbol, message: unit.error.message } };
  return definition.kind === 'derived' ? prepareDerived(bare, scope) : prepareGiven(bare);
}

function prepareDerived(bare: Prepared, scope: ExpressionScope): Prepared {
  const { symbol, expression: text = '' } = bare.definition;
  const parsed = parseExpression(text);
  if (!parsed.ok) return { ...bare, problem: fromExpression(parsed.error, symbol) };
  const dependsOn = parsed.value.symbols.map(scope.slotOf).filter((slot) => slot >= 0);
  const read = { ...bare, dependsOn };
  const dimension = checkDimensions(parsed.value, scope);
  if (!dimension.ok) return { ...read, problem: fromExpression(dimension.error, symbol) };
  if (isSameDimension(dimension.value, dimensionOf(bare.unit))) return { ...read, expression: parsed.value };
  const message = `${symbol} is a ${bare.unit.dimension}, but its expression gives a ${describeDimension(dimension.value)}.`;
  return { ...read, problem: { code: 'unit-mismatch', symbol, message } };
}

const expressionCodes: Partial<Record<ExpressionProblem['code'], CalcProblemCode>> = {
  'unknown-symbol': 'unknown-symbol',
  'unit-mismatch': 'unit-mismatch',
};

const fromExpression = ({ code, message, start, end }: ExpressionProblem, symbol: string): CalcProblem => ({
  code: expressionCodes[code] ?? 'bad-expression',
  symbol,
  message: `In the expression of ${symbol}: ${message}`,
  start,
  end,
});

/** The home of an input or constant: as given, or else what the paper prints. */
function prepareGiven(bare: Prepared): Prepared {
  const { definition, unit } = bare;
  const { symbol } = definition;
  const given = definition.home ?? definition.printed?.text;
  if (given === undefined)
    return {
      ...bare,
      homeProblem: {
        code: 'missing-home',
        symbol,
        message: `${symbol} has no home value. Give the value that the manual was printed for.`,
      },
    };
  const home = readValue(given, definition, unit);
  if (home.ok) return { ...bare, home: home.value };
  return { ...bare, homeProblem: { ...home.error, message: `The home value of ${symbol}: ${home.error.message}` } };
}
