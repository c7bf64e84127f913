import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { fromBase, toBase } from '#shared/units/convert.ts';
import { findUnit, type UnitDefinition } from '#shared/units/definitions.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { CalcProblem } from './problem.ts';
import type { QuantityDefinition } from './quantity.ts';

/** A value given for a quantity, in base units. A number, or a text without unit, is in the quantity's own unit. */
export function readValue(
  given: number | string,
  definition: QuantityDefinition,
  unit: UnitDefinition,
): Result<number, CalcProblem> {
  const { symbol } = definition;
  const base = typeof given === 'number' ? succeed(toBase(given, unit)) : readText(given, symbol, unit);
  if (!base.ok) return base;
  if (!Number.isFinite(base.value)) return fail({ code: 'not-finite', symbol, message: `${symbol} must be a number.` });
  if (definition.integer === true && !Number.isInteger(fromBase(base.value, unit))) {
    return fail({
      code: 'not-an-integer',
      symbol,
      message: `${symbol} must be a whole number, not ${String(given).trim()}.`,
    });
  }
  return base;
}

function readText(text: string, symbol: string, unit: UnitDefinition): Result<number, CalcProblem> {
  const parsed = parseQuantity(text);
  if (!parsed.ok) return fail({ code: 'not-a-quantity', symbol, message: parsed.error.message });
  if (parsed.value.range !== undefined)
    return fail({ code: 'not-a-quantity', symbol, message: `"${text.trim()}" is a range. Give ${symbol} one value.` });
  const written = findUnit(parsed.value.unit);
  if (parsed.value.unit === '' || !written.ok) return succeed(toBase(parsed.value.decimalText, unit));
  if (written.value.dimension === unit.dimension) return succeed(toBase(parsed.value.decimalText, written.value));
  return fail({
    code: 'unit-mismatch',
    symbol,
    message: `${symbol} is a ${unit.dimension}, but "${text.trim()}" is a ${written.value.dimension}.`,
  });
}
