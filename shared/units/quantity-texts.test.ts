import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert } from './convert.ts';
import { ambiguousSpellings, unitDefinitions } from './definitions.ts';
import { printQuantity } from './format-quantity.ts';
import { inSi } from './in-si.ts';
import { parseQuantity } from './parse-quantity.ts';
import { proposeQuantities } from './propose-quantities.ts';
import { bentTexts, quantityTexts } from './quantity-texts.cases.ts';

describe('quantities out of text', () => {
  it.each(quantityTexts)('"$text" prints back the same and is "$si"', ({ text, si }) => {
    const read = parseQuantity(text);
    expect(inSi(text) ?? '').toBe(si);
    if (si !== '') expect(read.ok && printQuantity(read.value)).toBe(text);
  });

  const spellings = unitDefinitions
    .filter(({ symbol }) => symbol !== '')
    .flatMap(({ symbol, exact = [], anyCase = [] }) =>
      [symbol, ...exact, ...anyCase].map((spelling) => ({ spelling, symbol })),
    )
    .filter(({ spelling }) => !ambiguousSpellings.some(({ text }) => text === spelling));

  it.each(spellings)('a number of "$spelling" prints back the same, and is as much in SI', ({ spelling, symbol }) => {
    const tolerance = fc.constantFrom('', ' \u00B1 5%', ' \u00B1 20 ppm', ' +10 -20 %', ' max', ', nominal');
    const number = fc.tuple(fc.integer({ min: 1, max: 9_999_999 }), fc.integer({ min: 0, max: 4 }), fc.boolean());
    fc.assert(
      fc.property(number, tolerance, ([digits, decimals, isBare], tail) => {
        const plain = (digits / 10 ** decimals).toFixed(decimals);
        const text = `${isBare && decimals > 0 ? plain.replace(/^0\./, '.') : plain} ${spelling}${tail}`;
        const read = parseQuantity(text);
        expect(read.ok && printQuantity(read.value)).toBe(text);
        const si = parseQuantity(inSi(text) ?? '');
        if (symbol === '\u00B0F') return;
        const back = si.ok ? convert(si.value.magnitude, si.value.unit, symbol) : si;
        expect(back.ok && Math.abs(back.value / (digits / 10 ** decimals) - 1)).toBeLessThan(1e-9);
      }),
      { numRuns: 30 },
    );
  });
});

describe('texts bent by recognition', () => {
  it.each(bentTexts)('"$read" may have been "$printed"', ({ read, printed }) => {
    const [first] = proposeQuantities(read);
    expect(first?.text).toBe(printed);
    expect(first?.confidence).toBeGreaterThan(0.5);
    expect(first?.confidence).toBeLessThan(1);
  });

  it('are less sure the more had to be mended, and nothing is made of what has no number', () => {
    const sure = (text: string) => proposeQuantities(text)[0]?.confidence ?? 0;
    expect(sure('100 kc')).toBeGreaterThan(sure('1OO kc'));
    expect(sure('1OO kc')).toBeGreaterThan(sure('1OO ke'));
    expect(proposeQuantities('see note')).toEqual([]);
    expect(proposeQuantities('')).toEqual([]);
  });
});
