import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { readNumber, readUnit } from './quantity-text.ts';

export type ToleranceKind = 'absolute' | 'percent' | 'ppm';
/** `plus` and `minus` are both written without sign; `unit` is given for an absolute tolerance that prints one. */
export type QuantityTolerance = { plus: number; minus: number; kind: ToleranceKind; unit?: string };
export type ToleranceText = { tolerance: QuantityTolerance; rest: string };

const plusMinusPattern = /^(?:\u00B1|\+\s*\/?\s*[-\u2212\u2013]|plus\s+or\s+minus)\s*/i;

/** Reads `±5 kc`, `+/- 10%`, `+30 -10 %`, `+80/-20%` or a bare `5%` at the start of `text`; undefined where none stands there. */
export function readTolerance(text: string): Result<ToleranceText, { message: string }> | undefined {
  const both = plusMinusPattern.exec(text)?.[0];
  if (both !== undefined) return readSymmetric(text.slice(both.length));
  if (text.startsWith('+')) return readTwoSided(text);
  const number = readNumber(text, 0);
  if (number === undefined) return undefined;
  return readPercentOnly(text, number);
}

function readSymmetric(text: string): Result<ToleranceText, { message: string }> {
  const number = readNumber(text, 0);
  if (number === undefined) return fail({ message: 'There is no number after ±.' });
  return finish(Number(number.decimalText), Number(number.decimalText), text.slice(number.end));
}

function readTwoSided(text: string): Result<ToleranceText, { message: string }> | undefined {
  const plus = readNumber(text, 0);
  if (plus === undefined) return undefined;
  // The unit may stand after the first number, after the second, or after both.
  const afterPlus = text.slice(plus.end).replace(/^\s*(?:%|percent)?\s*,?\s*\/?\s*/i, '');
  if (!/^[-\u2212\u2013]/.test(afterPlus)) return fail({ message: `"${text}" has a plus side but no minus side.` });
  const minus = readNumber(afterPlus, 0);
  if (minus === undefined) return fail({ message: `"${text}" has a plus side but no minus side.` });
  return finish(Number(plus.decimalText), -Number(minus.decimalText), afterPlus.slice(minus.end));
}

function readPercentOnly(
  text: string,
  number: { decimalText: string; end: number },
): Result<ToleranceText, { message: string }> | undefined {
  const unit = readUnit(text.slice(number.end));
  if (unit === undefined || !unit.ok || !['%', 'ppm'].includes(unit.value.unit.symbol)) return undefined;
  return finish(Number(number.decimalText), Number(number.decimalText), text.slice(number.end));
}

function finish(plus: number, minus: number, text: string): Result<ToleranceText, { message: string }> {
  const unit = readUnit(text);
  if (unit === undefined) return succeed({ tolerance: { plus, minus, kind: 'absolute' }, rest: text });
  if (!unit.ok) return fail({ message: unit.error.message });
  const rest = text.slice(unit.value.length);
  const symbol = unit.value.unit.symbol;
  if (symbol === '%') return succeed({ tolerance: { plus, minus, kind: 'percent' }, rest });
  if (symbol === 'ppm') return succeed({ tolerance: { plus, minus, kind: 'ppm' }, rest });
  return succeed({ tolerance: { plus, minus, kind: 'absolute', unit: symbol }, rest });
}
