import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { printedNumbersOf } from './printed-numbers.ts';

const text = (words: string): DocNode => ({ type: 'text', text: words });
const cell = (words: string): DocNode => ({
  type: 'tableCell',
  content: [{ type: 'paragraph', content: [text(words)] }],
});
const row = (role: string, cells: string[]): DocNode => ({
  type: 'tableRow',
  attrs: { role },
  content: cells.map(cell),
});

const document: DocNode = {
  type: 'doc',
  content: [
    {
      type: 'paragraph',
      content: [
        text('The first i-f is 10.700 mc, the injection '),
        { type: 'liveValue', attrs: { quantity: 'q1', printed: '145.900 mc' } },
        text('. See 5-3.'),
      ],
    },
    {
      type: 'table',
      attrs: { id: 't1', columns: [{ heading: 'CHAN' }, { heading: 'CRYSTAL (MC)' }, { heading: 'USE' }] },
      content: [row('head', ['CHAN', 'CRYSTAL (MC)', 'USE']), row('body', ['12', '16.211111', 'PORT'])],
    },
  ],
};

describe('the printed numbers of a manual', () => {
  const numbers = printedNumbersOf([{ pageId: 'p1', document }], new Map([['q1', 'injection']]));

  it('are those with a unit in its text, with the words ahead of them, and live ones with their symbol', () => {
    expect(numbers.slice(0, 2)).toMatchObject([
      { id: 'n1', text: '10.700 mc', value: 10.7e6, dimension: 'frequency', page: 'p1', label: 'First i-f' },
      { text: '145.900 mc', symbol: 'injection' },
    ]);
  });

  it('and those of its tables, in the unit of the head of their column', () => {
    expect(numbers.slice(2)).toMatchObject([
      { text: '12', dimension: 'plain number', column: { name: 'CHAN', row: 1 } },
      { value: 16_211_111, column: { table: 'p1 t1', name: 'CRYSTAL (MC)', row: 1 } },
    ]);
    expect(numbers).toHaveLength(4);
  });
});
