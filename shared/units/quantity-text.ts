import { canonicalLetters, findUnit, type UnitDefinition, type UnitProblem } from './definitions.ts';
import { fail, succeed, type Result } from '#shared/kit/result.ts';

/** The small pieces that a printed quantity is made of; parse-quantity.ts puts them together. */

const numberPattern = /^(?:\d{1,3}(?:,\d{3})+(?!\d)|\d+)(?:\.\d*)?|^\.\d+/;
const exponentPattern = /^[eE][+-]?\d+(?![A-Za-z0-9])/;
/** `10 x 10^-6`, `2.5 × 10⁻³`. */
const timesTenPattern =
  /^\s*[xX\u00D7]\s*10\s*(?:\^\s*([-+\u2212]?\d{1,2})|([\u207A\u207B]?[\u2070\u00B9\u00B2\u00B3\u2074-\u2079]{1,2}))/;
const raised = '\u2070\u00B9\u00B2\u00B3\u2074\u2075\u2076\u2077\u2078\u2079';
const signPattern = /^[-\u2212\u2013+]\s*(?=[\d.])/;
/** Letters (with the few signs that units use), and `/s` or `/sec` after them. */
const unitPattern =
  /^(?:per\s+cent|micro-micro[a-z]+|[A-Za-z\u00B5\u03BC\u03A9\u03C9\u2126\u00B0\u2103\u2109]+(?:\/(?:s(?:ec)?|m)(?![A-Za-z]))?|%)/i;

export type NumberText = {
  decimalText: string;
  decimals: number;
  grouped: boolean;
  start: number;
  end: number;
  /** A power of ten as printed (`e3`, ` x 10^-6`), and the digits after the point before it. */
  power?: PrintedPower;
};
export type PrintedPower = { text: string; power: number; decimals: number };

/** Reads a signed number at the start of `text`; `offset` is where `text` begins in the printed whole. */
export function readNumber(text: string, offset: number): NumberText | undefined {
  const sign = signPattern.exec(text)?.[0] ?? '';
  const digits = numberPattern.exec(text.slice(sign.length))?.[0];
  if (digits === undefined) return undefined;
  const { exponent, length } = readExponent(text.slice(sign.length + digits.length));
  const plain = digits.replaceAll(',', '');
  const point = plain.indexOf('.');
  const negative = sign !== '' && !sign.startsWith('+');
  return {
    decimalText: `${negative ? '-' : ''}${plain.startsWith('.') ? '0' : ''}${plain.replace(/\.$/, '')}${exponent}`,
    decimals: Math.max(0, (point < 0 ? 0 : plain.length - point - 1) - Number(exponent.slice(1))),
    ...(exponent === ''
      ? {}
      : {
          power: {
            text: text.slice(sign.length + digits.length, sign.length + digits.length + length),
            power: Number(exponent.slice(1)),
            decimals: point < 0 ? 0 : plain.length - point - 1,
          },
        }),
    grouped: digits.includes(','),
    start: offset,
    end: offset + sign.length + digits.length + length,
  };
}

/** As decimal text writes it (`e-6`), and how many characters of the print it takes. */
function readExponent(text: string): { exponent: string; length: number } {
  const short = exponentPattern.exec(text)?.[0];
  if (short !== undefined) return { exponent: short, length: short.length };
  const [whole = '', plain, small = ''] = timesTenPattern.exec(text) ?? [];
  if (whole === '') return { exponent: '', length: 0 };
  const spelled =
    plain ??
    [...small].map((each) => (each === '\u207B' ? '-' : raised.includes(each) ? raised.indexOf(each) : '')).join('');
  return { exponent: `e${spelled.replace('\u2212', '-')}`, length: whole.length };
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
