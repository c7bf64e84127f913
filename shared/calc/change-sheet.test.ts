import { describe, expect, it } from 'vitest';
import { changeSheet } from './change-sheet.ts';
import { compile } from './program.ts';
import type { QuantityDefinition } from './quantity.ts';

const quantity = (symbol: string, rest: Partial<QuantityDefinition>): QuantityDefinition => ({
  symbol,
  label: symbol,
  kind: 'derived',
  unit: 'mc',
  ...rest,
});
const program = compile([
  quantity('carrier', { kind: 'input', home: 156.6 }),
  quantity('injection', {
    expression: 'carrier - 10.7 MHz',
    printed: { text: '145.900 mc' },
    limits: { low: 145, high: 146 },
  }),
  quantity('crystal', { expression: 'injection / 9', printed: { text: '16.211111 mc' } }),
  quantity('firstIf', { kind: 'constant', home: 10.7 }),
]);
const on = (pageLabel: string, symbol: string, printed: string) => ({
  pageId: `p${pageLabel}`,
  pageLabel,
  symbol,
  printed,
});
const places = [
  on('5-1', 'crystal', '16.211111 mc'),
  on('5-1', 'injection', '145.900 mc'),
  on('5-1', 'injection', '145.900 mc'),
  on('5-2', 'injection', '145.900 mc'),
  on('5-2', 'firstIf', '10.7 mc'),
];

describe('a change sheet', () => {
  it('lists by page what prints otherwise, once a page, and what stands on none at the end', () => {
    const { rows, same } = changeSheet(program, places, { before: {}, after: { carrier: 156.8 } });
    expect(rows.map(({ pageLabel, symbol, before, after }) => [pageLabel, symbol, before, after])).toEqual([
      ['5-1', 'crystal', '16.211111 mc', '16.233333 mc'],
      ['5-1', 'injection', '145.900 mc', '146.100 mc'],
      ['5-2', 'injection', '145.900 mc', '146.100 mc'],
      [null, 'carrier', '156.6 mc', '156.8 mc'],
    ]);
    expect(same).toBe(1);
  });

  it('says what passes out of its limits, and what comes back', () => {
    const out = changeSheet(program, places, { before: {}, after: { carrier: 160 } });
    expect(out.rows.filter(({ limits }) => limits === 'leaves').map(({ symbol }) => symbol)).toEqual([
      'injection',
      'injection',
    ]);
    expect(out.leaving).toBe(2);
    const back = changeSheet(program, places, { before: { carrier: 160 }, after: {} });
    expect(back.rows.find(({ symbol }) => symbol === 'injection')?.limits).toBe('returns');
  });

  it('says why a value is not to be had', () => {
    const { rows, unavailable } = changeSheet(program, places, { before: {}, after: { carrier: 'much' } });
    expect(unavailable).toBe(4);
    expect(rows[0]).toMatchObject({ after: '', problem: expect.stringContaining('carrier') });
  });
});
