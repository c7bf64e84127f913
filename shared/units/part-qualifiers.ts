/** What stands behind the value in a parts list: tolerance, power, voltage, dielectric. All in base units; tolerances in percent or pF. */
export type PartQualifiers = {
  tolPct?: number;
  /** Of capacitors: an absolute tolerance in pF. */
  tolPf?: number;
  tolPlus?: number;
  tolMinus?: number;
  watts?: number;
  volts?: number;
  dielectric?: string;
};

type Rule = { pattern: RegExp; take: (found: Record<string, string>) => PartQualifiers };
const percent = '(?:%|pct|percent)';
/** Each is searched once and cut out. Order counts: `+80 -20%` before a bare `20%`, `1-1/2 watt` before `2 watt`. */
const rules: readonly Rule[] = [
  {
    pattern: new RegExp(`\\+\\s*(?<plus>[\\d.]+)\\s*%?\\s*,?/?\\s*[-\u2212]\\s*(?<minus>[\\d.]+)\\s*${percent}`, 'i'),
    take: ({ plus, minus }) => ({ tolPlus: Number(plus), tolMinus: Number(minus) }),
  },
  {
    pattern: /(?:\u00B1|\+\s*\/?\s*-)\s*(?<pf>[\d.]+)\s*(?:[u\u00B5\u03BC]{2}fd?|mmfd?|pf)\b/i,
    take: ({ pf }) => ({ tolPf: Number(pf) }),
  },
  {
    pattern: new RegExp(`(?:\u00B1|\\+\\s*/?\\s*-)?\\s*(?<![\\d.])(?<pct>\\d*\\.?\\d+)\\s*${percent}`, 'i'),
    take: ({ pct }) => ({ tolPct: Number(pct) }),
  },
  {
    pattern: /(?:(?<whole>\d+)-)?(?<over>\d+)\/(?<under>\d+)\s*w(?:atts?)?(?![a-z])/i,
    take: ({ whole, over, under }) => ({ watts: Number(whole ?? 0) + Number(over) / Number(under) }),
  },
  { pattern: /(?<![\d.])(?<watts>\d*\.?\d+)\s*w(?:atts?)?(?![a-z])/i, take: ({ watts }) => ({ watts: Number(watts) }) },
  {
    pattern: /(?<![\d.])(?<volts>\d*\.?\d+)\s*(?<kilo>k?)(?:wvdc|vdc|volts?|v)(?![a-z])/i,
    take: ({ volts, kilo }) => ({ volts: Number(volts) * (kilo === '' ? 1 : 1000) }),
  },
  // OCR and typists write NP0 and C0G with the letter O.
  { pattern: /\bnp[0o]\b/i, take: () => ({ dielectric: 'NP0' }) },
  { pattern: /\bc[0o]g\b/i, take: () => ({ dielectric: 'C0G' }) },
  { pattern: /\b(?<code>[xyz][2-9][a-fprstuv])\b/i, take: ({ code = '' }) => ({ dielectric: code.toUpperCase() }) },
];

/** Takes the qualifiers out of an entry; what is left is the value. A voltage alone is a value, not a rating. */
export function takeQualifiers(entry: string, isVoltage: boolean): { value: string; qualifiers: PartQualifiers } {
  let value = entry;
  let qualifiers: PartQualifiers = {};
  for (const { pattern, take } of rules) {
    const found = pattern.exec(value);
    if (found === null || found.index === 0) continue;
    const taken = take({ ...found.groups });
    if (isVoltage && taken.volts !== undefined) continue;
    qualifiers = { ...qualifiers, ...taken };
    value = `${value.slice(0, found.index)} ${value.slice(found.index + found[0].length)}`;
  }
  return { value: value.replace(/[\s,;]+$/, '').trim(), qualifiers };
}
