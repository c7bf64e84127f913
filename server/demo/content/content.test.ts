import { evaluate } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { demoManuals } from './manuals.ts';
import { shipFrequencyKc } from './maritime-channels.ts';
import { pageText } from './page-text.ts';
import type { DemoManual, LivePlace, ManualPage } from './types.ts';

/** Plain numbers, in cycles: the units of the manuals and what one of each is. */
const unitSizes: Readonly<Record<string, number>> = { '': 1, kc: 1e3, mc: 1e6, percent: 0.01 };

const sizeOf = (unit: string): number => {
  const size = unitSizes[unit];
  if (size === undefined) throw new Error(`No size for the unit ${unit}`);
  return size;
};

function homeValues(manual: DemoManual): Record<string, number> {
  const values: Record<string, number> = {};
  const lookup = (name: string, channel: number, column: string): number => {
    expect([name, column]).toEqual(['maritime-vhf', 'ship']);
    return shipFrequencyKc(channel) * 1e3;
  };
  for (const { symbol, home, unit, expression } of manual.quantities) {
    values[symbol] =
      expression === undefined ? (home ?? NaN) * sizeOf(unit) : Number(evaluate(expression, { ...values, lookup }));
  }
  return values;
}

const withoutSpaces = (page: ManualPage): string => pageText(page).replaceAll(/\s+/g, ' ');

/** How often the words stand on the page, not counting the middle of a longer number. */
function occurrences(haystack: string, words: string): number {
  const escaped = words.replaceAll(/[.*+?^${}()|[\]\\]/g, String.raw`\$&`);
  return [...haystack.matchAll(new RegExp(String.raw`(?<![\d.])${escaped}(?!\d)`, 'g'))].length;
}

const numberIn = (text: string): string => /\d[\d.]*/.exec(text)?.[0] ?? '';

describe.each(demoManuals)('$title', (manual) => {
  const values = homeValues(manual);
  const pageOf = ({ pageLabel }: Pick<LivePlace, 'pageLabel'>): ManualPage => {
    const page = manual.pages.find(({ label }) => label === pageLabel);
    if (page === undefined) throw new Error(`No page ${pageLabel}`);
    return page;
  };

  it('gives each page a label of its own, printed at its foot', () => {
    const labels = manual.pages.map(({ label }) => label);
    expect(new Set(labels).size).toBe(labels.length);
    for (const { label, blocks } of manual.pages.filter((page) => page.label !== 'Cover')) {
      expect(blocks.at(-1)).toEqual({ kind: 'foot', text: label });
      expect(blocks[0]?.kind).toBe('head');
    }
  });

  it('names each quantity once, with a symbol that a formula can use', () => {
    const symbols = manual.quantities.map(({ symbol }) => symbol);
    expect(new Set(symbols).size).toBe(symbols.length);
    for (const symbol of symbols) expect(symbol).toMatch(/^[A-Za-z][A-Za-z0-9_]*$/);
  });

  it.each(manual.quantities)('prints $symbol as its value, to the printed digits', ({ symbol, unit, printed }) => {
    const digits = numberIn(printed.text);
    const decimals = digits.split('.')[1]?.length ?? 0;
    expect(((values[symbol] ?? NaN) / sizeOf(unit)).toFixed(decimals)).toBe(digits);
    expect(printed.text).toBe(`${digits} ${unit}`.trim());
    expect(withoutSpaces(pageOf(printed))).toContain(printed.text);
  });

  it.each(manual.livePlaces)('finds $text of $symbol at one place on page $pageLabel', (place) => {
    const text = withoutSpaces(pageOf(place));
    expect(occurrences(text, place.text)).toBeGreaterThan(0);
    const words = place.context === undefined ? place.text : `${place.context} ${place.text}`;
    expect(occurrences(text, words)).toBe(1);
    const printed = manual.quantities.find(({ symbol }) => symbol === place.symbol)?.printed;
    expect(numberIn(place.text)).toBe(numberIn(printed?.text ?? ''));
  });

  it('keeps every row of a table as long as its heading', () => {
    for (const block of manual.pages.flatMap(({ blocks }) => blocks)) {
      if (block.kind === 'table') for (const row of block.rows) expect(row).toHaveLength(block.columns.length);
      if (block.kind !== 'parts-table') continue;
      for (const row of block.rows) expect(row.cells).toHaveLength(row.kind === 'section' ? 1 : block.columns.length);
    }
  });

  it('puts every warning before a step', () => {
    for (const { label, blocks } of manual.pages.filter((page) => /^\d/.test(page.label))) {
      const kinds = blocks.map(({ kind }) => kind);
      expect(kinds.lastIndexOf('warning'), label).toBeLessThanOrEqual(kinds.lastIndexOf('step'));
    }
  });
});

describe('the maritime plan', () => {
  it.each([
    [1, 156_050],
    [12, 156_600],
    [16, 156_800],
    [28, 157_400],
    [60, 156_025],
    [88, 157_425],
  ])('has channel %i at %i kc', (channel, kc) => expect(shipFrequencyKc(channel)).toBe(kc));

  it.each([0, 29, 59, 89, 12.5])('has no channel %d', (channel) => {
    expect(() => shipFrequencyKc(channel)).toThrow(RangeError);
  });
});
