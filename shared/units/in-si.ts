import { ExactDecimal } from './convert.ts';
import { findUnit, unitDefinitions, type UnitDefinition } from './definitions.ts';
import { parseQuantity } from './parse-quantity.ts';
import type { ParsedQuantity } from './parsed-quantity.ts';

/** Symbols that SI does not know (inches, percent) are not offered, nor those too rare to be read at a glance. */
const foreign = new Set(['%', 'ppm', 'in', 'cm', 'dBc']);

/** The units of one kind with SI prefixes, smallest first. */
const scalesOf = (dimension: UnitDefinition['dimension']): UnitDefinition[] =>
  unitDefinitions
    .filter((unit) => unit.dimension === dimension && !foreign.has(unit.symbol))
    .sort((a, b) => Number(a.factor) - Number(b.factor));

/** The unit in which this many base units have one to three digits before the point. */
export function readableUnit(base: number, dimension: UnitDefinition['dimension']): UnitDefinition | undefined {
  const scales = scalesOf(dimension);
  // A hair of room: 999.9999999999999 Hz is 1 kHz.
  return scales.findLast(({ factor }) => Math.abs(base) >= Number(factor) * (1 - 1e-12)) ?? scales[0];
}

/** `455 kc` → `455 kHz`, `15 µµf` → `15 pF`, `4K7 5%` → `4.7 kΩ ± 5 %`: the same quantity in SI's spelling. Undefined for what is no quantity. */
export function inSi(printed: string | ParsedQuantity): string | undefined {
  const parsed = typeof printed === 'string' ? parseQuantity(printed) : { ok: true as const, value: printed };
  if (!parsed.ok) return undefined;
  const quantity = parsed.value;
  const unit = findUnit(quantity.unit);
  if (!unit.ok) return undefined;
  if (unit.value.symbol === '°F') return celsius(quantity);
  const scaled = scaleOf(quantity, unit.value);
  const write = (decimalText: number | string, decimals: number): string =>
    new ExactDecimal(decimalText)
      .times(unit.value.factor)
      .div(scaled.factor)
      .toFixed(Math.max(0, decimals + decimalShift(unit.value, scaled)));
  const { range, decimalText, layout } = quantity;
  // 1.5e3 is known to the hundred, not to the unit.
  const decimals = layout.power === undefined ? quantity.decimals : layout.power.decimals - layout.power.power;
  const number =
    range === undefined
      ? write(decimalText, decimals)
      : `${write(range.low, decimals)} to ${write(range.high, decimals)}`;
  return [number, scaled.symbol, toleranceInSi(quantity)].filter((part) => part !== '').join(' ');
}

/** Inches become millimetres; anything else moves to the prefix that reads best. Levels, percent and plain numbers stay. */
function scaleOf({ magnitude }: ParsedQuantity, unit: UnitDefinition): UnitDefinition {
  if (['', '%', 'ppm'].includes(unit.symbol) || magnitude === 0) return unit;
  const millimetre = unit.symbol === 'in' ? findUnit('mm') : undefined;
  if (millimetre?.ok === true) return millimetre.value;
  if (unit.dimension.includes('level')) return unit;
  const base = new ExactDecimal(magnitude).times(unit.factor).toNumber();
  return readableUnit(base, unit.dimension) ?? unit;
}

/** How many decimals more the same digits need in the other unit; an inch is 25.4 mm, one more. */
const decimalShift = (from: UnitDefinition, to: UnitDefinition): number =>
  from.symbol === 'in' ? 1 : Math.ceil(Math.log10(Number(to.factor) / Number(from.factor)) - 1e-9);

function toleranceInSi({ tolerance, unit }: ParsedQuantity): string {
  if (tolerance === undefined) return '';
  const { plus, minus, kind } = tolerance;
  const spelled = kind === 'percent' ? '%' : kind === 'ppm' ? 'ppm' : (tolerance.unit ?? unit);
  return plus === minus ? `± ${plus} ${spelled}`.trimEnd() : `+${plus} \u2212${minus} ${spelled}`.trimEnd();
}

/** 32 °F is 0 °C and a degree of one is 5/9 of the other, exactly (NIST SP 811, B.8; from memory). */
function celsius({ range, decimalText, decimals, tolerance }: ParsedQuantity): string {
  const convert = (value: number | string): string =>
    new ExactDecimal(value).minus(32).times(5).div(9).toFixed(decimals);
  const number = range === undefined ? convert(decimalText) : `${convert(range.low)} to ${convert(range.high)}`;
  const degrees = (side: number): string =>
    new ExactDecimal(side)
      .times(5)
      .div(9)
      .toFixed(decimals + 1);
  if (tolerance === undefined || tolerance.kind !== 'absolute') return `${number} °C`;
  const { plus, minus } = tolerance;
  return `${number} °C ${plus === minus ? `± ${degrees(plus)}` : `+${degrees(plus)} \u2212${degrees(minus)}`} °C`;
}
