import type { CrystalEvidence } from '#shared/crystal/identify.ts';
import { toBase } from '#shared/units/convert.ts';
import { dimensionOf, findUnit } from '#shared/units/definitions.ts';
import { isSameDimension } from '#shared/units/dimensions.ts';
import { parseQuantity } from '#shared/units/parse-quantity.ts';

/** What a person types about a crystal, with units or in the usual ones. */
export type Typed = {
  marked: string;
  markedOvertone: string;
  series: string;
  parallel: string;
  nearThird: string;
  nearFifth: string;
  testCapacitor: string;
  testFrequency: string;
};
export const nothingTyped: Typed = {
  marked: '',
  markedOvertone: '',
  series: '',
  parallel: '',
  nearThird: '',
  nearFifth: '',
  testCapacitor: '',
  testFrequency: '',
};

export type Read = { evidence: CrystalEvidence; faults: Partial<Record<keyof Typed, string>> };

/** In base units; a number without a unit is in MHz, or in pF. `none` in a field of responses: looked for, nothing found. */
export function evidenceFrom(typed: Typed): Read {
  const faults: Read['faults'] = {};
  const read = (field: keyof Typed, unit: 'MHz' | 'pF'): number | undefined => {
    const found = inBase(typed[field], unit);
    if (found === 'wrong')
      faults[field] = unit === 'pF' ? 'A capacitance, like 30 pF.' : 'A frequency, like 16.211 MHz.';
    return typeof found === 'number' ? found : undefined;
  };
  const response = (field: 'nearThird' | 'nearFifth'): number | null | undefined =>
    /^(none|no|nothing|-)$/i.test(typed[field].trim()) ? null : read(field, 'MHz');
  const [markedHz, seriesHz, parallelHz] = [read('marked', 'MHz'), read('series', 'MHz'), read('parallel', 'MHz')];
  const [nearThirdHz, nearFifthHz] = [response('nearThird'), response('nearFifth')];
  const [farads, hz] = [read('testCapacitor', 'pF'), read('testFrequency', 'MHz')];
  const overtone = typed.markedOvertone === '' ? undefined : Number(typed.markedOvertone);
  const evidence: CrystalEvidence = {
    ...(markedHz === undefined ? {} : { markedHz }),
    ...(overtone === undefined ? {} : { markedOvertone: overtone }),
    ...(seriesHz === undefined ? {} : { seriesHz }),
    ...(parallelHz === undefined ? {} : { parallelHz }),
    ...(nearThirdHz === undefined ? {} : { nearThirdHz }),
    ...(nearFifthHz === undefined ? {} : { nearFifthHz }),
    ...(farads === undefined || hz === undefined ? {} : { load: { farads, hz } }),
  };
  return { evidence, faults };
}

function inBase(text: string, usual: 'MHz' | 'pF'): number | undefined | 'wrong' {
  if (text.trim() === '') return undefined;
  const parsed = parseQuantity(text);
  if (!parsed.ok || !(parsed.value.magnitude > 0)) return 'wrong';
  const [unit, expected] = [findUnit(parsed.value.unit === '' ? usual : parsed.value.unit), findUnit(usual)];
  if (!unit.ok || !expected.ok || !isSameDimension(dimensionOf(unit.value), dimensionOf(expected.value)))
    return 'wrong';
  return toBase(parsed.value.magnitude, unit.value);
}
