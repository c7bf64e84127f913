import { canonicalLetters, findUnit, type UnitDefinition, type UnitProblem } from './definitions.ts';
import { fail, succeed, type Result } from '#shared/kit/result.ts';

/** The small pieces that a printed quantity is made of; parse-quantity.ts puts them together. */

const numberPattern = /^(?:\d{1,3}(?:,\d{3})+(?!\d)|\d+)(?:\.\d*)?|^\.\d+/;
const exponentPattern = /^[eE][+-]?\d+(?![A-Za-z0-9])/;
const signPattern = /^[-\u2212\u2013+]\s*(?=[\d.])/;
/** Letters (with the few signs that units use), and `/s` or `/sec` after them. */
const unitPattern = /^(?:per\s+cent|[A-Za-z\u00B5\u03BC\u03A9\u03C9\u2126\u00B0\u2103]+(?:\/s(?:ec)?(?![A-Za-z]))?|%)/i;

export type NumberText = { decimalText: string; decimals: number; grouped: boolean; start: number; end: number };

/** Reads a signed number at the start of `text`; `offset` is where `text` begins in the printed whole. */
export function readNumber(text: string, offset: number): NumberText | undefined {
  const sign = signPattern.exec(text)?.[0] ?? '';
  const digits = numberPattern.exec(text.slice(sign.length))?.[0];
  if (digits === undefined) return undefined;
  const exponent = exponentPattern.exec(text.slice(sign.length + digits.length))?.[0] ?? '';
  const plain = digits.replaceAll(',', '');
  const point = plain.indexOf('.');
  const negative = sign !== '' && !sign.startsWith('+');
  return {
    decimalText: `${negative ? '-' : ''}${plain.startsWith('.') ? '0' : ''}${plain.replace(/\.$/, '')}${exponent}`,
    decimals: Math.max(0, (point < 0 ? 0 : plain.length - point - 1) - Number(exponent.slice(1))),
    grouped: digits.includes(','),
    start: offset,
    end: offset + sign.length + digits.length + exponent.length,
  };
}

export type UnitText = { unit: UnitDefinition; text: string; length: number };

/** Reads a unit at the start of `text`, or says why the word there is none. Undefined where no word stands there. */
export function readUnit(text: string): Result<UnitText, UnitProblem> | undefined {
  const space = /^\s*/.exec(text)?.[0].length ?? 0;
  const word = unitPattern.exec(text.slice(space))?.[0];
  if (word === undefined) return undefined;
  const spelled = /^per\s+cent$/i.test(word) ? 'percent' : word;
  const found = findUnit(spelled);
  if (!found.ok) return fail(found.error);
  const stop = /^in$/i.test(word) && text.charAt(space + word.length) === '.' ? 1 : 0;
  return succeed({ unit: found.value, text: canonicalLetters(spelled), length: space + word.length + stop });
}

/** Words that say what kind of volt or ampere it is, not how many: they stay in the print and do not count. */
const remarkPattern =
  /^(?:ac|a\.c\.|dc|d\.c\.|rms|peak|pk|p-p|pp|max(?:imum)?|min(?:imum)?|nom(?:inal)?|approx(?:imately)?|typ(?:ical)?)(?![A-Za-z])\.?/i;
export const aboutPattern = /^(?:approx(?:imately)?\.?|about|nom(?:inal)?\.?|~)\s*/i;

/** Skips spaces, commas, brackets and remarks; returns what is left. */
export function skipRemarks(text: string): string {
  let rest = text;
  for (;;) {
    const next = rest.replace(/^[\s,;()]+/, '').replace(remarkPattern, '');
    if (next === rest) return rest;
    rest = next;
  }
}
