/** Necessary bandwidth as emission designators write it, 47 CFR 2.202(b): three numerals, and the unit's letter at the point. */
const letters: readonly { letter: string; factor: number }[] = [
  { letter: 'G', factor: 1e9 },
  { letter: 'M', factor: 1e6 },
  { letter: 'K', factor: 1e3 },
  { letter: 'H', factor: 1 },
];

/** `2K40` → 2400. The first character is never 0, K, M or G. Undefined where it is no such code. */
export function readBandwidth(code: string): number | undefined {
  const [, whole = '', letter = '', fraction = ''] = /^(\d*)([HKMG])(\d*)$/.exec(code) ?? [];
  if (letter === '' || whole.length + fraction.length !== 3) return undefined;
  if (whole.startsWith('0') || (whole === '' && letter !== 'H')) return undefined;
  const factor = letters.find((each) => each.letter === letter)?.factor ?? 1;
  return Number(((Number(`${whole}${fraction}`) * factor) / 10 ** fraction.length).toPrecision(12));
}

/** 2400 → `2K40`: rounded to three figures, half up. Below 1 Hz the letter leads, with as many thousandths. */
export function writeBandwidth(hz: number): string {
  if (hz < 1) return `H${String(Math.round(hz * 1000)).padStart(3, '0')}`;
  const rounded = Number(hz.toPrecision(3));
  const { letter, factor } = letters.find((each) => rounded >= each.factor) ?? { letter: 'H', factor: 1 };
  const digits = (rounded / factor).toPrecision(3);
  return digits.includes('.') ? digits.replace('.', letter) : `${digits}${letter}`;
}
