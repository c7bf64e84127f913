import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert, fromBase, toBase } from './convert.ts';
import { findUnit, unitDefinitions } from './definitions.ts';
import { formatLikePrinted, formatQuantity, roundToDecimals } from './format-quantity.ts';
import { parseQuantity } from './parse-quantity.ts';
import { sameQuantity, searchKey } from './same-quantity.ts';

describe('writing like the printed text', () => {
  it.each([
    [16.26666666, 'MHz', '16.211111 mc', '16.266667 mc'],
    [0.456, 'MHz', '455 kc', '456 kc'],
    [0.45600049, 'MHz', '455.0 kc', '456.0 kc'],
    [456, 'kHz', '.455 mc', '.456 mc'],
    [1456, 'kHz', '.455 mc', '1.456 mc'],
    [1234.5, 'Hz', '1,000 cps', '1,235 cps'],
    [1234567, 'Hz', '1,000 cps', '1,234,567 cps'],
    [999, 'Hz', '1,000 cps', '999 cps'],
    [10.8, 'MHz', '10.7 mc ± 5 kc', '10.8 mc ± 5 kc'],
    [5600, 'Ω', '4K7 5%', '5K6 5%'],
    [0.33, 'Ω', 'R47', 'R33'],
    [47_000, 'Ω', '22K', '47K'],
    [7.25, 'V', '6.3 v ac', '7.3 v ac'],
    [-0.01, 'V', '0.5 v', '0.0 v'],
    [-97, 'dBm', '-107 dbm', '-97 dbm'],
    [12e-12, 'F', '15 µµf', '12 µµf'],
    [68, '', '12', '68'],
    [156.65, 'MHz', '156.600', '156.650'],
    [3.4, 'mA', '3 to 5 ma', '3 ma'],
    [5, 'V', 'see note', '5 V'],
    [5, 'V', '10 mc', '5 V'],
  ])('%d %s, printed "%s", becomes "%s"', (value, unit, printed, text) => {
    expect(formatLikePrinted(value, unit, printed)).toBe(text);
  });

  it('gives back what was printed when nothing has changed', () => {
    const number = fc
      .tuple(fc.integer({ min: 0, max: 9_999_999 }), fc.integer({ min: 0, max: 4 }))
      .map(([digits, decimals]) => {
        const text = (digits / 10 ** decimals).toFixed(decimals);
        return text.startsWith('0.') ? text.slice(1) : text;
      });
    const tail = fc.constantFrom('', ' ± 5%', ' max', ' +10 -20 %');
    fc.assert(
      fc.property(number, fc.constantFrom('kc', 'MC', 'µµf', 'meg', 'v', 'ma', 'dbm'), tail, (digits, unit, end) => {
        const printed = `${digits} ${unit}${end}`;
        const read = parseQuantity(printed);
        expect(read.ok && formatLikePrinted(read.value.magnitude, read.value.unit, printed)).toBe(printed);
      }),
    );
  });
});

describe('writing with nothing printed', () => {
  it.each([
    [16.211111111111, 'MHz', {}, '16.2111111 MHz'],
    [10.7, 'mc', {}, '10.7 mc'],
    [0.1 + 0.2, '', {}, '0.3'],
    [2.5, '', { decimals: 0 }, '3'],
    [-2.5, '', { decimals: 0 }, '-3'],
    [1.005, 'V', { decimals: 2 }, '1.01 V'],
    [1.0049999999999999, 'V', { decimals: 2 }, '1.01 V'],
    [156.6, 'MHz', { significant: 6 }, '156.600 MHz'],
    [0, 'V', { significant: 3 }, '0 V'],
    [1e-12, 'F', {}, '0.000000000001 F'],
  ])('%d %s with %o becomes "%s"', (value, unit, options, text) => {
    expect(formatQuantity(value, unit, options)).toBe(text);
  });

  it('rounds half away from zero', () => {
    expect([0.125, -0.125, 0.135].map((each) => roundToDecimals(each, 2))).toEqual([0.13, -0.13, 0.14]);
  });
});

describe('converting', () => {
  it.each([
    [455, 'kc', 'MHz', 0.455],
    [156.6, 'MHz', 'Hz', 156_600_000],
    [16.211111, 'mc', 'Hz', 16_211_111],
    [15, 'µµf', 'mfd', 0.000015],
    [1, 'in', 'mm', 25.4],
    [2.2, 'meg', 'k', 2200],
    [5, '%', 'ppm', 50_000],
  ])('%d %s is %f %s', (value, from, to, expected) => {
    const result = convert(value, from, to);
    // The table row is value, from, to, expected: exact, no nearness.
    expect(result).toEqual({ ok: true, value: expected });
  });

  it('refuses other kinds, and levels in other references', () => {
    expect(convert(1, 'MHz', 'V')).toMatchObject({ ok: false, error: { code: 'unit-mismatch' } });
    expect(convert(1, 'dBm', 'dBµV')).toMatchObject({ ok: false });
    expect(convert(1, 'MHz', 'furlong')).toMatchObject({ ok: false, error: { code: 'unknown-unit' } });
  });

  it('comes back to the same number for every unit', () => {
    fc.assert(
      fc.property(fc.constantFrom(...unitDefinitions), fc.integer({ min: -1e9, max: 1e9 }), (unit, micro) => {
        const value = micro / 1e6;
        expect(fromBase(toBase(value, unit), unit)).toBeCloseTo(value, 9);
      }),
    );
  });

  it('keeps a millihertz at ten gigahertz', () => {
    const ghz = findUnit('GHz');
    expect(ghz.ok && toBase('10.000000000001', ghz.value)).toBe(10_000_000_000.001);
  });
});

describe('the search key', () => {
  it.each([
    ['455 kc', '0.455 MHz'],
    ['.001 mfd', '1000 µµf'],
    ['2.2 meg', '2200 k'],
    ['4K7', '4700 ohms'],
    ['10.7 mc ± 5 kc', '10.700 MHz'],
  ])('"%s" and "%s" are the same', (a, b) => {
    expect(sameQuantity(a, b)).toBe(true);
  });

  it('keeps different kinds and different values apart', () => {
    expect(sameQuantity('455 kc', '455 k')).toBe(false);
    expect(sameQuantity('455 kc', '455.001 kc')).toBe(false);
    expect(searchKey('455 kc')).toBe('frequency:455000');
    expect(searchKey('not a quantity')).toBeUndefined();
    expect(searchKey('3 to 5 ma')).toBeUndefined();
  });
});
