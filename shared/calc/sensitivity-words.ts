import { fromBase, toBase } from '#shared/units/convert.ts';
import { findUnit, type UnitDefinition } from '#shared/units/definitions.ts';
import { readableUnit } from '#shared/units/in-si.ts';
import type { Sensitivity } from './describe-value.ts';
import type { QuantityDefinition } from './quantity.ts';

type Named = Pick<QuantityDefinition, 'symbol' | 'label' | 'unit'>;

/**
 * `1 kHz at the carrier is 111 Hz at the crystal`: what a small move of an input comes to. Three digits, because a slope is
 * a help to judge by. Undefined where a unit is unknown or nothing moves.
 */
export function sensitivityWords(input: Named, output: Named, { absolute }: Sensitivity): string | undefined {
  const [from, to] = [findUnit(input.unit), findUnit(output.unit)];
  if (!from.ok || !to.ok || absolute === 0 || !Number.isFinite(absolute)) return undefined;
  const step = stepOf(from.value);
  const moved = toBase(absolute, to.value) * fromBase(toBase(1, step), from.value);
  const unit = readableUnit(moved, to.value.dimension) ?? to.value;
  const sign = moved < 0 ? '\u2212' : '';
  const amount = Number(Math.abs(fromBase(moved, unit)).toPrecision(3));
  return `1${spaced(step)} at ${nameOf(input)} is ${sign}${amount}${spaced(unit)} at ${nameOf(output)}`;
}

const spaced = ({ symbol }: UnitDefinition): string => (symbol === '' ? '' : ` ${symbol}`);

/** A frequency is moved by a kilohertz, whatever its unit: a megahertz off is no small move. */
function stepOf(unit: UnitDefinition): UnitDefinition {
  const kilohertz = findUnit('kHz');
  return unit.dimension === 'frequency' && kilohertz.ok ? kilohertz.value : unit;
}

/** `Carrier` is the carrier; `IF of the receiver` keeps its capitals. */
function nameOf({ label, symbol }: Named): string {
  const name = label.trim() === '' ? symbol : label.trim();
  const isWord = /^[A-Z][a-z]/.test(name);
  return /^the\s/i.test(name) ? name : `the ${isWord ? name.charAt(0).toLowerCase() + name.slice(1) : name}`;
}
