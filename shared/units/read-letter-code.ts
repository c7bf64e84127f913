import type { Head } from './parsed-quantity.ts';

/** Letter codes of IEC 60062: the letter stands at the decimal point. `m` is left out: it reads as metre or milli by turns. */
const codeLetters: Readonly<Record<string, string>> = {
  R: 'Ω',
  K: 'kΩ',
  k: 'kΩ',
  M: 'MΩ',
  p: 'pF',
  n: 'nF',
  u: 'µF',
  '\u00B5': 'µF',
  '\u03BC': 'µF',
};

/** Only R may lead or end: "K7" is more likely a relay, and "47K" reads as a unit anyway. */
const codePatterns: readonly RegExp[] = [
  /^(?<whole>\d+)(?<letter>[RKkMpnu\u00B5\u03BC])(?<fraction>\d+)(?![A-Za-z0-9.])/,
  /^(?<whole>)(?<letter>R)(?<fraction>\d+)(?![A-Za-z0-9.])/,
  /^(?<whole>\d+)(?<letter>R)(?<fraction>)(?![A-Za-z0-9.])/,
];

/** Reads `4K7`, `R47` or `470R` where the number of `printed` begins. */
export function readLetterCode(printed: string, start: number): Head | undefined {
  const text = printed.slice(start);
  const found = codePatterns.map((pattern) => pattern.exec(text)).find((each) => each !== null);
  if (found?.groups === undefined) return undefined;
  const { whole = '', letter = '', fraction = '' } = found.groups;
  const decimalText = `${whole || '0'}${fraction === '' ? '' : `.${fraction}`}`;
  const end = start + found[0].length;
  const layout = { start, end, notation: 'letter' as const, grouped: false, bareDecimalPoint: whole === '' };
  const unit = codeLetters[letter] ?? 'Ω';
  return {
    head: { magnitude: Number(decimalText), decimalText, unit, decimals: fraction.length, printed, layout },
    rest: printed.slice(end),
  };
}
