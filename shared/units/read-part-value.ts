import { fail, succeed, type Result } from '#shared/kit/result.ts';
import { ExactDecimal } from './convert.ts';
import { findUnit, type UnitDefinition } from './definitions.ts';
import type { DimensionName } from './dimensions.ts';
import { readMarking, smallToleranceLetters, toleranceLetters, type Marking, type PartKind } from './part-marking.ts';
import { takeQualifiers, type PartQualifiers } from './part-qualifiers.ts';

/** A value of a parts list in base units (Ω, F, H, Hz, V). `convention`: the print has no unit, the drawing's note gives it. */
export type PartValue = PartQualifiers & { value: number; convention?: true; doubt?: string };

const dimensionOfKind: Readonly<Record<PartKind, DimensionName>> = {
  resistor: 'resistance',
  'chip resistor': 'resistance',
  capacitor: 'capacitance',
  inductor: 'inductance',
  frequency: 'frequency',
  voltage: 'voltage',
};

/**
 * Reads an entry of a parts list, or the marking of a part, knowing what kind of part it is: `4K7J`, `.005 mfd +80 -20% 500V`,
 * `104M`. The kind decides what a bare number and a letter mean, so none is read without it.
 */
export function readPartValue(entry: string, kind: PartKind): Result<PartValue, { message: string }> {
  const { value: text, qualifiers } = takeQualifiers(entry.trim(), kind === 'voltage');
  const marked = readMarking(text, kind);
  if (marked !== undefined) return succeed({ ...withTolerance(marked, kind), ...qualifiers, ...doubtOf(text, kind) });
  const read = readDecimal(text, kind);
  if (read === undefined) return fail({ message: `"${entry.trim()}" is not understood as the value of a ${kind}.` });
  return succeed({ ...read, ...qualifiers });
}

function withTolerance({ value, tolerance }: Marking, kind: PartKind): PartValue {
  if (tolerance === undefined) return { value };
  const small = kind === 'capacitor' && value < 10e-12 ? smallToleranceLetters[tolerance] : undefined;
  if (small !== undefined) return { value, tolPf: small };
  const letter = toleranceLetters[tolerance];
  if (letter === undefined) return { value };
  return typeof letter === 'number' ? { value, tolPct: letter } : { value, tolPlus: letter[0], tolMinus: letter[1] };
}

/** Readings that a person should decide once for each manual. */
const doubts: readonly { kind: PartKind; pattern: RegExp; doubt: string }[] = [
  { kind: 'resistor', pattern: /^\d+M$/, doubt: 'In some American lists before about 1950, M means a thousand.' },
  {
    kind: 'capacitor',
    pattern: /^\d{3}$/,
    doubt: 'As a marking its last figure counts noughts; in a parts list it may be plain pF.',
  },
  { kind: 'capacitor', pattern: /^\d*m\d+$/, doubt: 'Inside a number m is milli; in a period list it may be micro.' },
];
function doubtOf(text: string, kind: PartKind): { doubt?: string } {
  const found = doubts.find((each) => each.kind === kind && each.pattern.test(text));
  return found === undefined ? {} : { doubt: found.doubt };
}

const numberPattern = /^(?<digits>\d{1,3}(?:,\d{3})+(?:\.\d+)?|\d+,\d{1,2}|\d*\.\d+|\d+\.?)\s*(?<unit>.*)$/;

function readDecimal(text: string, kind: PartKind): PartValue | undefined {
  const { digits, unit: word = '' } = numberPattern.exec(text)?.groups ?? {};
  if (digits === undefined) return undefined;
  // A comma before exactly three figures groups; before one or two it is the decimal comma.
  const decimalText = /,\d{3}/.test(digits) ? digits.replaceAll(',', '') : digits.replace(',', '.');
  if (word === '') return readBare(decimalText, kind);
  const unit = unitFor(word, kind);
  return unit === undefined ? undefined : { value: new ExactDecimal(decimalText).times(unit.factor).toNumber() };
}

function unitFor(word: string, kind: PartKind): UnitDefinition | undefined {
  const spelled = word.replace(/\.$/, '').replace(/\s+/g, '');
  // A bare h is a henry only where a coil is meant.
  const found = findUnit(kind === 'inductor' && /^h$/i.test(spelled) ? 'H' : spelled);
  return found.ok && found.value.dimension === dimensionOfKind[kind] ? found.value : undefined;
}

/** Ohms; and for capacitors the usual note on the drawing: below 1 in µF, from 1 on in pF (common practice, no source). */
function readBare(decimalText: string, kind: PartKind): PartValue | undefined {
  if (kind === 'resistor') return { value: Number(decimalText) };
  if (kind !== 'capacitor') return undefined;
  const factor = Number(decimalText) < 1 ? '1e-6' : '1e-12';
  return { value: new ExactDecimal(decimalText).times(factor).toNumber(), convention: true };
}
