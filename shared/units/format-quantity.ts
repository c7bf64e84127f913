import { convert, ExactDecimal } from './convert.ts';
import { parseQuantity } from './parse-quantity.ts';
import type { ParsedQuantity, QuantityLayout } from './parsed-quantity.ts';

export type FormatOptions = { decimals?: number | undefined; significant?: number | undefined };

/** With nothing printed to imitate: enough for 1 Hz at 100 MHz, few enough to hide a double's last digits. */
const usualSignificant = 9;
/** A double carries 15 sure digits; rounding to them first keeps 1.0049999999999999 from losing a tie that it should win. */
const sureDigits = 15;

const settle = (value: number) => new ExactDecimal(value).toSignificantDigits(sureDigits);

/** `10.7 MHz`: rounded half away from zero, plain digits, the unit spelled as given. */
export function formatQuantity(value: number, unit: string, options: FormatOptions = {}): string {
  const digits = formatNumber(value, options);
  return unit === '' ? digits : `${digits} ${unit}`;
}

function formatNumber(value: number, { decimals, significant }: FormatOptions): string {
  if (!Number.isFinite(value)) return String(value);
  if (decimals !== undefined) return withoutMinusZero(settle(value).toFixed(decimals));
  const rounded = settle(value).toSignificantDigits(significant ?? usualSignificant);
  if (significant === undefined || rounded.isZero()) return withoutMinusZero(rounded.toFixed());
  return withoutMinusZero(rounded.toFixed(Math.max(0, significant - rounded.e - 1)));
}

/**
 * Writes a value the way the paper does: its unit and spelling, its number of decimals, its thousands separators,
 * its bare point (`.455 mc`), its letter code (`4K7`), and everything after the number, tolerance included.
 */
export function formatLikePrinted(value: number, unit: string, printedText: string): string {
  const parsed = parsePrinted(printedText);
  if (!parsed.ok || !Number.isFinite(value)) return formatQuantity(value, unit);
  const { layout, unit: printedUnit } = parsed.value;
  const inPrinted = printedUnit === '' ? { ok: true as const, value } : convert(value, unit, printedUnit);
  if (!inPrinted.ok) return formatQuantity(value, unit);
  const number = writeNumber(inPrinted.value, parsed.value);
  return `${printedText.slice(0, layout.start)}${number}${printedText.slice(layout.end)}`;
}

/** A page writes the same few hundred printed texts anew with every change; reading them took most of the time that it did. */
const keptReadings = 4000;
const readings = new Map<string, ReturnType<typeof parseQuantity>>();
function parsePrinted(text: string): ReturnType<typeof parseQuantity> {
  const known = readings.get(text);
  if (known !== undefined) return known;
  if (readings.size >= keptReadings) readings.clear();
  const read = parseQuantity(text);
  readings.set(text, read);
  return read;
}

function writeNumber(value: number, parsed: ParsedQuantity): string {
  const { layout, printed } = parsed;
  const { power } = layout;
  const shifted = power === undefined ? settle(value) : settle(value).times(`1e${-power.power}`);
  const fixed = withoutMinusZero(shifted.toFixed(power?.decimals ?? parsed.decimals));
  const [sign, whole, point] = takeApart(fixed);
  const written = printed.slice(layout.start, layout.end);
  const lead = leadLike(whole, point, layout);
  if (layout.notation === 'letter') return `${sign}${lead}${/\D/.exec(written)?.[0] ?? ''}${point.slice(1)}`;
  // `455.` keeps its idle point.
  const end = point === '' && /^[^.]*\d\.(?!\d)/.test(written) ? '.' : point;
  return `${signLike(sign, written)}${lead}${end}${power?.text ?? ''}`;
}

function takeApart(fixed: string): [sign: string, whole: string, point: string] {
  const [, sign = '', whole = '', point = ''] = /^(-?)(\d+)(.*)$/.exec(fixed) ?? [];
  return [sign, whole, point];
}

/** The sign as the paper writes it: a plus that it prints, its own kind of minus. */
function signLike(sign: string, written: string): string {
  const printedSign = /^[-+\u2212\u2013]\s*/.exec(written)?.[0] ?? '';
  if (sign === '') return printedSign.startsWith('+') ? printedSign : '';
  return printedSign === '' || printedSign.startsWith('+') ? sign : printedSign;
}

function leadLike(whole: string, point: string, { bareDecimalPoint, grouped }: QuantityLayout): string {
  if (bareDecimalPoint && whole === '0' && point !== '') return '';
  return grouped ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
}

const withoutMinusZero = (digits: string): string => (/^-0(?:\.0*)?$/.test(digits) ? digits.slice(1) : digits);

/** The quantity as the paper prints it: written anew from what was read, so that a reading that loses something shows. */
export function printQuantity(parsed: ParsedQuantity): string {
  const { printed, range, decimalText, unit } = parsed;
  // The ends of a range may have different units and digits; they are not taken apart again.
  if (range !== undefined) return printed;
  return formatLikePrinted(Number(decimalText), unit, printed);
}

/** Rounds to printed decimals, half away from zero; for comparing with paper. */
export const roundToDecimals = (value: number, decimals: number): number =>
  settle(value).toDecimalPlaces(decimals).toNumber();
