import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatQuantity } from './format-quantity.ts';
import { parseQuantity } from './parse-quantity.ts';
import { ambiguousSpellings, findUnit, unitDefinitions } from './definitions.ts';

const spellings = unitDefinitions.flatMap((unit) =>
  [
    unit.symbol,
    ...(unit.exact ?? []),
    ...(unit.anyCase ?? []),
    ...(unit.anyCase ?? []).map((each) => each.toUpperCase()),
  ]
    .filter((spelling) => !ambiguousSpellings.some(({ text }) => text === spelling))
    .map((spelling) => ({ spelling, symbol: unit.symbol })),
);

describe('every unit in the table', () => {
  it.each(spellings)('"$spelling" is read as $symbol', ({ spelling, symbol }) => {
    expect(parseQuantity(`2.5 ${spelling}`)).toMatchObject({
      ok: true,
      value: { magnitude: 2.5, unit: symbol, decimals: 1 },
    });
  });

  it('has no spelling that belongs to two units', () => {
    const owners = new Map<string, string>();
    for (const { spelling, symbol } of spellings) {
      const found = findUnit(spelling);
      expect(found).toMatchObject({ ok: true, value: { symbol } });
      owners.set(spelling, symbol);
    }
    expect(owners.size).toBeGreaterThan(150);
  });

  it.each(ambiguousSpellings)('"$text" is refused with a remedy, not guessed', ({ text, remedy }) => {
    const read = parseQuantity(`10 ${text}`);
    expect(read).toMatchObject({ ok: false, error: { code: 'ambiguous-unit' } });
    expect(read.ok ? '' : read.error.message).toContain(remedy);
  });
});

/** Period notation as in the reference notes on parts lists, section 2; letter codes as in IEC 60062 (section 1 there). */
const printedQuantities = [
  ['2.2875 GHz', 2.2875, 'GHz', 4],
  ['455 kc', 455, 'kHz', 0],
  ['455 KC', 455, 'kHz', 0],
  ['10.7 mc', 10.7, 'MHz', 1],
  ['156.600 MC', 156.6, 'MHz', 3],
  ['2 Mc/s', 2, 'MHz', 0],
  ['9 kmc', 9, 'GHz', 0],
  ['15 µµf', 15, 'pF', 0],
  ['15 \u03BC\u03BCf', 15, 'pF', 0],
  ['.001 mfd', 0.001, 'µF', 3],
  ['2.2 meg', 2.2, 'MΩ', 1],
  ['100 \u2126', 100, 'Ω', 0],
  ['470R', 470, 'Ω', 0],
  ['R47', 0.47, 'Ω', 2],
  ['4R7', 4.7, 'Ω', 1],
  ['8K2', 8.2, 'kΩ', 1],
  ['47K', 47, 'kΩ', 0],
  ['4M7', 4.7, 'MΩ', 1],
  ['4p7', 4.7, 'pF', 1],
  ['±0.005 percent', 0.005, '%', 3],
  ['0.1 per cent', 0.1, '%', 1],
  ['-107 dbm', -107, 'dBm', 0],
  ['\u2212107 dBm', -107, 'dBm', 0],
  ['1,000 cps', 1000, 'Hz', 0],
  ['1,234,567.5 c', 1234567.5, 'Hz', 1],
  ['0.5 µv', 0.5, 'µV', 1],
  ['6.3 v ac', 6.3, 'V', 1],
  ['120 vac', 120, 'V', 0],
  ['1 in. max', 1, 'in', 0],
  ['approx. 5 ma', 5, 'mA', 0],
  ['1200 µmhos', 1200, 'µS', 0],
  ['16', 16, '', 0],
  ['1.5e3 hz', 1500, 'Hz', 0],
] as const;

describe('printed quantities', () => {
  it.each(printedQuantities)('"%s" is %d %s with %d decimals', (text, magnitude, unit, decimals) => {
    expect(parseQuantity(text)).toMatchObject({ ok: true, value: { magnitude, unit, decimals, printed: text } });
  });

  it.each([
    ['10.7 mc ± 5 kc', { plus: 5, minus: 5, kind: 'absolute', unit: 'kHz' }],
    ['10.7 mc +/- 5 kc', { plus: 5, minus: 5, kind: 'absolute', unit: 'kHz' }],
    ['10.7 mc +-5 kc', { plus: 5, minus: 5, kind: 'absolute', unit: 'kHz' }],
    ['5 ± 1 v', { plus: 1, minus: 1, kind: 'absolute', unit: 'V' }],
    ['4K7 5%', { plus: 5, minus: 5, kind: 'percent' }],
    ['4.7 k, ±10 percent', { plus: 10, minus: 10, kind: 'percent' }],
    ['100 K (10%)', { plus: 10, minus: 10, kind: 'percent' }],
    ['40 mfd +30 -10 %', { plus: 30, minus: 10, kind: 'percent' }],
    ['100 uuf +80/-20%', { plus: 80, minus: 20, kind: 'percent' }],
    ['16.211111 mc ± 20 ppm', { plus: 20, minus: 20, kind: 'ppm' }],
  ])('"%s" carries its tolerance', (text, tolerance) => {
    expect(parseQuantity(text)).toMatchObject({ ok: true, value: { tolerance } });
  });

  it.each([
    ['3 to 5 ma', { magnitude: 4, unit: 'mA', range: { low: 3, high: 5 } }],
    ['3-5 ma', { magnitude: 4, unit: 'mA', range: { low: 3, high: 5 } }],
    ['900 kc to 1.1 mc', { magnitude: 1, unit: 'MHz', range: { low: 0.9, high: 1.1 } }],
  ])('"%s" is a range', (text, value) => {
    expect(parseQuantity(text)).toMatchObject({ ok: true, value });
  });

  it.each([
    '',
    '   ',
    'mc',
    'K7',
    '2 foo',
    '4,7 k',
    '.05-600',
    '5 to 3 ma',
    '10.7 mc ±',
    '10.7 mc ± 5 v',
    '3 mc 4',
    '+5 v -',
    '1.2.3 v',
    '12 v and more',
    'x'.repeat(200),
  ])('"%s" is refused with words', (text) => {
    const read = parseQuantity(text);
    expect(read.ok).toBe(false);
    expect(read.ok ? '' : read.error.message.length).toBeGreaterThan(10);
  });

  it('reads back whatever it writes', () => {
    const decimal = fc.tuple(fc.integer({ min: -99_999_999, max: 99_999_999 }), fc.integer({ min: 0, max: 6 }));
    fc.assert(
      fc.property(decimal, fc.constantFrom(...unitDefinitions), ([digits, decimals], unit) => {
        const value = Number(`${digits}e-${decimals}`);
        const read = parseQuantity(formatQuantity(value, unit.symbol, { decimals }));
        expect(read).toMatchObject({
          ok: true,
          value: { magnitude: value === 0 ? 0 : value, unit: unit.symbol, decimals },
        });
      }),
    );
  });

  it('never throws, whatever it is given', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => typeof parseQuantity(text).ok === 'boolean'),
      { numRuns: 500 },
    );
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom('1', '.', ',', '+', '-', '±', '%', ' ', 'kc', 'to', '/', 'K', 'R', 'e', '(')),
        (parts) => typeof parseQuantity(parts.join('')).ok === 'boolean',
      ),
      { numRuns: 2000 },
    );
  });
});
