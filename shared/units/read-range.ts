import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { ExactDecimal } from './convert.ts';
import { plainUnit, type UnitDefinition } from './definitions.ts';
import type { Head, ParsedQuantity, QuantityProblem } from './parsed-quantity.ts';
import { readNumber, readUnit, type NumberText } from './quantity-text.ts';

const jointPattern = /^\s*(?:to|thru|through|\.\.\.?|[-\u2013])\s*(?=[-\u2212\d.])/i;

/** One end of a range with the unit behind it, if one is there. */
type End = { number: NumberText; unit: UnitDefinition | undefined; after: number };

/** `3 to 5 ma`, `3 ma to 5 ma`, `3-5 ma`. Without a unit after it, a hyphen is no range: `.05-600` is a value and its voltage. */
export function readRange(printed: string, number: NumberText): Result<Head, QuantityProblem> | undefined {
  const first = endOf(printed, number);
  if (!first.ok) return undefined;
  const joint = jointPattern.exec(printed.slice(first.value.after))?.[0];
  if (joint === undefined) return undefined;
  const secondStart = first.value.after + joint.length;
  const secondNumber = readNumber(printed.slice(secondStart), secondStart);
  if (secondNumber === undefined) return undefined;
  const second = endOf(printed, secondNumber);
  if (!second.ok) return second;
  if (second.value.unit === undefined && /^\s*[-\u2013]/.test(joint)) {
    return fail({
      code: 'not-understood',
      message: `"${printed.trim()}" may be a range or two values. Write "to", or the unit, if it is a range.`,
    });
  }
  return joinEnds(first.value, second.value, printed);
}

/** A word that is no unit ends the reading of the first end, and is an error behind the second. */
function endOf(printed: string, number: NumberText): Result<End, QuantityProblem> {
  const unit = readUnit(printed.slice(number.end));
  if (unit === undefined) return succeed({ number, unit: undefined, after: number.end });
  if (unit.ok) return succeed({ number, unit: unit.value.unit, after: number.end + unit.value.length });
  // "3 to 5": the joint itself looks like a word that is no unit.
  if (jointPattern.test(printed.slice(number.end))) return succeed({ number, unit: undefined, after: number.end });
  return fail({ code: 'unknown-unit', message: unit.error.message });
}

function joinEnds(first: End, second: End, printed: string): Result<Head, QuantityProblem> {
  const unit = second.unit ?? first.unit ?? plainUnit;
  const firstUnit = first.unit ?? unit;
  if (firstUnit.dimension !== unit.dimension)
    return fail({
      code: 'not-understood',
      message: `The two ends of "${printed.trim()}" have different kinds of units.`,
    });
  const low = new ExactDecimal(first.number.decimalText).times(firstUnit.factor).div(unit.factor);
  const high = new ExactDecimal(second.number.decimalText);
  if (high.lt(low)) return fail({ code: 'not-understood', message: `The range "${printed.trim()}" runs backwards.` });
  const middle = low.plus(high).div(2);
  const head: ParsedQuantity = {
    magnitude: middle.toNumber(),
    decimalText: middle.toString(),
    unit: unit.symbol,
    decimals: second.number.decimals,
    range: { low: low.toNumber(), high: high.toNumber() },
    printed,
    layout: {
      start: first.number.start,
      end: second.number.end,
      notation: 'range',
      grouped: second.number.grouped,
      bareDecimalPoint: false,
    },
  };
  return succeed({ head, rest: printed.slice(second.after) });
}
