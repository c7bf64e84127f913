import { ExactDecimal } from './convert.ts';
import type { Head } from './parsed-quantity.ts';
import { readNumber, readUnit, type NumberText } from './quantity-text.ts';

/**
 * `+0.25 -0 mc`, `+80 -20%`: two deviations with nothing before them, as a column of tolerances prints them. Read as the
 * range from one to the other. Undefined for anything else; a plus with one number is a signed number.
 */
export function readDeviation(printed: string): Head | undefined {
  const ends = readEnds(printed);
  if (ends === undefined) return undefined;
  const { plus, minus } = ends;
  const unit = readUnit(printed.slice(minus.end));
  // A word that is no unit is for the usual reading to refuse.
  if (unit?.ok === false) return undefined;
  const known = unit?.value;
  const middle = new ExactDecimal(plus.decimalText).plus(minus.decimalText).div(2);
  return {
    head: {
      magnitude: middle.toNumber(),
      decimalText: middle.toString(),
      unit: known?.unit.symbol ?? '',
      decimals: Math.max(plus.decimals, minus.decimals),
      range: { low: Number(minus.decimalText), high: Number(plus.decimalText) },
      printed,
      layout: { start: plus.start, end: minus.end, notation: 'range', grouped: false, bareDecimalPoint: false },
    },
    rest: printed.slice(minus.end + (known?.length ?? 0)),
  };
}

function readEnds(printed: string): { plus: NumberText; minus: NumberText } | undefined {
  const start = /^\s*(?=\+\s*[\d.])/.exec(printed)?.[0].length;
  if (start === undefined) return undefined;
  const plus = readNumber(printed.slice(start), start);
  if (plus === undefined) return undefined;
  const joint = /^\s*(?:%|percent)?\s*[,/]?\s*(?=[-\u2212\u2013]\s*[\d.])/i.exec(printed.slice(plus.end))?.[0];
  if (joint === undefined) return undefined;
  const minusStart = plus.end + joint.length;
  const minus = readNumber(printed.slice(minusStart), minusStart);
  return minus === undefined ? undefined : { plus, minus };
}
