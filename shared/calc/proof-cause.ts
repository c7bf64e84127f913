import { convert } from '#shared/units/convert.ts';
import { roundToDecimals } from '#shared/units/format-quantity.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';
import type { ParsedQuantity } from '#shared/units/parsed-quantity.ts';
import { evaluate } from './evaluate.ts';
import type { Program } from './program.ts';
import type { ProofItem } from './proof.ts';

export type ProofCause = {
  kind: 'rounding' | 'digit' | 'swapped' | 'unit' | 'point' | 'sign' | 'factor' | 'offset';
  /** What may be amiss, as one sentence. */
  says: string;
};

/** Printed and computed number in the printed unit, with what the manual's other numbers are in that unit. */
type Case = { printed: ParsedQuantity; computed: number; others: readonly { symbol: string; value: number }[] };
type Test = (given: Case) => ProofCause | null;

/** The likeliest reason why a value does not come out as printed; null where nothing simple explains it. */
export function likeliestCause(program: Program, item: ProofItem): ProofCause | null {
  const given = item.agrees ? null : caseOf(program, item);
  if (given === null) return null;
  for (const test of tests) {
    const cause = test(given);
    if (cause !== null) return cause;
  }
  return null;
}

function caseOf(program: Program, { symbol, printed: text }: ProofItem): Case | null {
  const printed = parseQuantity(text);
  const { values } = evaluate(program);
  const value = values[symbol];
  if (!printed.ok || value === undefined || value.value === null) return null;
  const { unit } = printed.value;
  const inPrinted = (each: { value: number | null; unit: string }): number | null => {
    if (each.value === null) return null;
    const converted = unit === '' ? { ok: true as const, value: each.value } : convert(each.value, each.unit, unit);
    return converted.ok ? converted.value : null;
  };
  const computed = inPrinted(value);
  if (computed === null) return null;
  const others = Object.entries(values).flatMap(([other, each]) => {
    const number = other === symbol ? null : inPrinted(each);
    return number === null ? [] : [{ symbol: other, value: number }];
  });
  return { printed: printed.value, computed, others };
}

const digitsOf = (value: number, { decimals }: ParsedQuantity): string =>
  roundToDecimals(value, decimals).toFixed(decimals);
const unitOfLastDigit = ({ decimals }: ParsedQuantity): number => 10 ** -decimals;
/** Alike to the digits that are printed. */
const isPrintedAs = (value: number, printed: ParsedQuantity): boolean =>
  Math.abs(value - printed.magnitude) <= unitOfLastDigit(printed) * 0.51;

const rounding: Test = ({ printed, computed }) =>
  Math.abs(computed - printed.magnitude) < unitOfLastDigit(printed) * 1.01
    ? {
        kind: 'rounding',
        says: 'It differs by less than one in the last printed digit: the paper may cut off instead of rounding.',
      }
    : null;

const sign: Test = ({ printed, computed }) =>
  isPrintedAs(-computed, printed)
    ? { kind: 'sign', says: 'Only the sign differs: a difference may be taken the wrong way round.' }
    : null;

const digit: Test = ({ printed, computed }) => {
  const [was, is] = [digitsOf(printed.magnitude, printed), digitsOf(computed, printed)];
  const places = was.length === is.length ? [...was].flatMap((each, at) => (each === is[at] ? [] : [at])) : [];
  const [first = -1, second = -1] = places;
  if (places.length === 1)
    return {
      kind: 'digit',
      says: `One digit differs: ${was[first]} may have been read, or printed, for ${is[first]}.`,
    };
  if (places.length === 2 && second === first + 1 && was[first] === is[second] && was[second] === is[first])
    return {
      kind: 'swapped',
      says: `Two digits stand the other way round: ${was[first]}${was[second]} for ${is[first]}${is[second]}.`,
    };
  return null;
};

const scale: Test = ({ printed, computed }) => {
  const power = Math.round(Math.log10(Math.abs(printed.magnitude / computed)));
  if (power === 0 || !Number.isFinite(power) || !isPrintedAs(computed * 10 ** power, printed)) return null;
  return power % 3 === 0
    ? {
        kind: 'unit',
        says: `It is ${power > 0 ? 'smaller' : 'larger'} by 10 to the ${Math.abs(power)}: the unit may be another, kc for mc say.`,
      }
    : { kind: 'point', says: 'The digits are the same and the point stands elsewhere.' };
};

const largestFactor = 128;

const factor: Test = ({ printed, computed }) => {
  const ratio = printed.magnitude / computed;
  const whole = Math.round(Math.abs(ratio) >= 1 ? ratio : 1 / ratio);
  if (whole < 2 || whole > largestFactor) return null;
  const isMore = Math.abs(ratio) >= 1;
  if (!isPrintedAs(isMore ? computed * whole : computed / whole, printed)) return null;
  return {
    kind: 'factor',
    says: `The paper has it ${isMore ? `${whole} times as large` : `divided by ${whole}`}: the formula may lack a multiplication.`,
  };
};

/** A value that is added where it should be taken away differs by twice that value. */
const offset: Test = ({ printed, computed, others }) => {
  for (const times of [1, 2]) {
    for (const { symbol, value } of others) {
      if (value === 0) continue;
      const hit = [1, -1].find((way) => isPrintedAs(computed + way * times * value, printed));
      if (hit === undefined) continue;
      return {
        kind: 'offset',
        says:
          times === 2
            ? `It differs by twice ${symbol}: ${symbol} may belong on the other side, above instead of below.`
            : `It differs by just ${symbol}, which the formula may lack or have too much.`,
      };
    }
  }
  return null;
};

const tests: readonly Test[] = [rounding, sign, digit, scale, factor, offset];
