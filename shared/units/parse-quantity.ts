import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { findUnit, type UnitProblem } from './definitions.ts';
import { quantityOf, type Head, type ParsedQuantity, type QuantityProblem } from './parsed-quantity.ts';
import { readTolerance, type QuantityTolerance } from './parse-tolerance.ts';
import { aboutPattern, readNumber, readUnit, skipRemarks, type NumberText } from './quantity-text.ts';
import { readDeviation } from './read-deviation.ts';
import { readLetterCode } from './read-letter-code.ts';
import { readRange } from './read-range.ts';

/** Longer text than this is a sentence, not a quantity. */
const longestQuantity = 120;

/** Reads one quantity as manuals print it: `10.7 mc ± 5 kc`, `.001 mfd`, `4K7 5%`, `3 to 5 ma`, `6.3 v ac`. */
export function parseQuantity(printed: string): Result<ParsedQuantity, QuantityProblem> {
  if (printed.trim() === '')
    return fail({
      code: 'not-a-quantity',
      message: 'There is nothing to read. Write a number and its unit, like 455 kc.',
    });
  if (printed.length > longestQuantity)
    return fail({
      code: 'not-a-quantity',
      message: `This is longer than ${longestQuantity} characters: too long for one quantity.`,
    });
  const head = readHead(printed);
  return head.ok ? finish(head.value, printed) : head;
}

/** The number, or both numbers of a range, and the unit. */
function readHead(printed: string): Result<Head, QuantityProblem> {
  const deviation = readDeviation(printed);
  if (deviation !== undefined) return succeed(deviation);
  const start = startOfNumber(printed);
  const code = readLetterCode(printed, start);
  if (code !== undefined) return succeed(code);
  const number = readNumber(printed.slice(start), start);
  if (number === undefined)
    return fail({ code: 'not-a-quantity', message: `"${printed.trim()}" does not begin with a number.` });
  if (/^,\d/.test(printed.slice(number.end))) {
    return fail({
      code: 'not-understood',
      message: 'A comma only groups thousands here (1,000). Write a point for decimals.',
    });
  }
  return readRange(printed, number) ?? readSingle(printed, number);
}

function startOfNumber(printed: string): number {
  const space = /^\s*/.exec(printed)?.[0].length ?? 0;
  const about = aboutPattern.exec(printed.slice(space))?.[0].length ?? 0;
  // A tolerance may be a quantity of its own: ±0.005 percent.
  const plusMinus = /^(?:\u00B1|\+\s*\/?\s*-)\s*/.exec(printed.slice(space + about))?.[0].length ?? 0;
  return space + about + plusMinus;
}

function readSingle(printed: string, number: NumberText): Result<Head, QuantityProblem> {
  const tail = printed.slice(number.end);
  const unit = readUnit(tail);
  // A remark such as "max" is no unit, and not a mistaken one either.
  const isRemark = skipRemarks(tail) !== tail.trimStart();
  if (unit !== undefined && !unit.ok && !isRemark) return fail(fromUnit(unit.error));
  const known = unit?.ok === true ? unit.value : undefined;
  return succeed({ head: quantityOf(number, known?.unit.symbol ?? '', printed), rest: tail.slice(known?.length ?? 0) });
}

const fromUnit = ({ code, message }: UnitProblem): QuantityProblem => ({
  code: code === 'ambiguous-unit' ? code : 'unknown-unit',
  message,
});

/** What follows the number and its unit: remarks, one tolerance, nothing else. */
function finish({ head, rest }: Head, printed: string): Result<ParsedQuantity, QuantityProblem> {
  const tail = skipRemarks(rest);
  if (tail === '') return succeed(head);
  const tolerance = readTolerance(tail);
  if (tolerance === undefined)
    return fail({ code: 'not-understood', message: `"${tail}" in "${printed.trim()}" is not understood.` });
  if (!tolerance.ok) return fail({ code: 'not-understood', message: tolerance.error.message });
  const left = skipRemarks(tolerance.value.rest);
  if (left !== '')
    return fail({ code: 'not-understood', message: `"${left}" in "${printed.trim()}" is not understood.` });
  // `5 ± 1 v` prints the unit once, behind the tolerance.
  const unit = head.unit === '' ? (tolerance.value.tolerance.unit ?? '') : head.unit;
  const problem = toleranceMismatch(tolerance.value.tolerance, unit);
  return problem === undefined ? succeed({ ...head, unit, tolerance: tolerance.value.tolerance }) : fail(problem);
}

function toleranceMismatch({ unit }: QuantityTolerance, of: string): QuantityProblem | undefined {
  if (unit === undefined) return undefined;
  const [own, its] = [findUnit(unit), findUnit(of)];
  if (own.ok && its.ok && own.value.dimension === its.value.dimension) return undefined;
  return {
    code: 'not-understood',
    message: `The tolerance is in ${unit}, but the quantity is in ${of === '' ? 'no unit' : of}.`,
  };
}
