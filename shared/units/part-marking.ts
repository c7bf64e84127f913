import { ExactDecimal } from './convert.ts';

/** A value as marked on a part, in base units, with the letter for its tolerance if there is one. */
export type Marking = { value: number; tolerance?: string };
export type PartKind = 'resistor' | 'capacitor' | 'inductor' | 'frequency' | 'voltage' | 'chip resistor';

/** Letters that stand at the decimal point, and what they multiply by: IEC 60062. For coils R is the point in µH, which is makers' practice. */
const pointLetters: Partial<Record<PartKind, Readonly<Record<string, string>>>> = {
  resistor: { R: '1', K: '1e3', k: '1e3', M: '1e6', G: '1e9', T: '1e12' },
  'chip resistor': { R: '1' },
  capacitor: { p: '1e-12', n: '1e-9', u: '1e-6', '\u00B5': '1e-6', '\u03BC': '1e-6', m: '1e-3', R: '1e-12' },
  inductor: { R: '1e-6' },
};

const scaled = (decimalText: string, factor: string): number => new ExactDecimal(decimalText).times(factor).toNumber();

/** `4K7`, `R47`, `470R`, `33p`, each perhaps with the letter of its tolerance: `4K7J`. */
function readPointLetter(text: string, kind: PartKind): Marking | undefined {
  const letters = pointLetters[kind];
  if (letters === undefined) return undefined;
  const found = new RegExp(`^(\\d*)([${Object.keys(letters).join('')}])(\\d*)([A-Z]?)$`).exec(text);
  if (found === null) return undefined;
  const [whole, letter, fraction, tolerance] = found.slice(1) as [string, string, string, string];
  if (whole + fraction === '' || (tolerance !== '' && !(tolerance in toleranceLetters))) return undefined;
  const value = scaled(`${whole || '0'}.${fraction || '0'}`, letters[letter] ?? '1');
  return tolerance === '' ? { value } : { value, tolerance };
}

/** Figures and then the number of noughts: pF on capacitors, Ω on chips. 8 is × 0.01 and 9 × 0.1 on capacitors (from memory). */
function readDigits(text: string, kind: PartKind): Marking | undefined {
  const pattern = kind === 'chip resistor' ? /^(\d{2,3})(\d)()$/ : /^(\d{2})(\d)([A-Z]?)$/;
  const [, figures = '', noughts = '', tolerance = ''] = pattern.exec(text) ?? [];
  if (figures === '') return undefined;
  const power = kind === 'capacitor' && noughts >= '8' ? Number(noughts) - 10 : Number(noughts);
  const value = scaled(figures, `1e${kind === 'capacitor' ? power - 12 : power}`);
  return tolerance === '' ? { value } : { value, tolerance };
}

/** Two figures count into the E96 series, a letter multiplies: IEC 60062:2016; the letters from memory. */
const chipLetters: Readonly<Record<string, string>> = {
  Z: '0.001',
  Y: '0.01',
  R: '0.01',
  X: '0.1',
  S: '0.1',
  A: '1',
  B: '10',
  H: '10',
  C: '100',
  D: '1e3',
  E: '1e4',
  F: '1e5',
};
function readChipCode(text: string): Marking | undefined {
  const [, figures = '', letter = ''] = /^(\d{2})([ZYRXSABHCDEF])$/.exec(text) ?? [];
  const at = Number(figures);
  if (figures === '' || at < 1 || at > 96) return undefined;
  return { value: scaled(String(Math.round(100 * 10 ** ((at - 1) / 96))), chipLetters[letter] ?? '1') };
}

/** Reads what is printed on a part of this kind; undefined where it is no marking. */
export function readMarking(text: string, kind: PartKind): Marking | undefined {
  const hasDigits = kind === 'capacitor' || kind === 'chip resistor';
  const chip = kind === 'chip resistor' ? readChipCode(text) : undefined;
  return chip ?? readPointLetter(text, kind) ?? (hasDigits ? readDigits(text, kind) : undefined);
}

/** IEC 60062 (from memory; C, D, J, K, M and Z agree with two makers' tables): percent, or plus and minus. */
export const toleranceLetters: Readonly<Record<string, number | readonly [number, number]>> = {
  E: 0.005,
  L: 0.01,
  P: 0.02,
  W: 0.05,
  B: 0.1,
  C: 0.25,
  D: 0.5,
  F: 1,
  G: 2,
  H: 3,
  J: 5,
  K: 10,
  M: 20,
  N: 30,
  Q: [30, 10],
  T: [50, 10],
  S: [50, 20],
  Z: [80, 20],
};
/** Of capacitors below 10 pF these are in pF. */
export const smallToleranceLetters: Readonly<Record<string, number>> = { B: 0.1, C: 0.25, D: 0.5, F: 1, G: 2 };
