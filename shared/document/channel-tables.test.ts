import { describe, expect, it } from 'vitest';
import { compile } from '#shared/calc/program.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { channelTablesOf } from './channel-tables.ts';
import type { DocNode } from './define-block.ts';

const cell = (text: string): DocNode => ({
  type: 'tableCell',
  content: [{ type: 'paragraph', ...(text === '' ? {} : { content: [{ type: 'text', text }] }) }],
});
const row = (cells: string[], role = 'body'): DocNode => ({
  type: 'tableRow',
  attrs: { role },
  content: cells.map(cell),
});
const columns = [
  { heading: 'CHAN', meaning: 'channel' },
  { heading: 'CARRIER (MC)', meaning: 'frequency' },
  { heading: 'CRYSTAL (MC)', meaning: 'frequency' },
  { heading: 'USE', meaning: 'remarks' },
];
const page = (kind: string, rows: string[][]): DocNode => ({
  type: 'doc',
  content: [
    { type: 'caption', attrs: { of: 'table' }, content: [{ type: 'text', text: 'Table 5-2. Channel crystals' }] },
    {
      type: 'table',
      attrs: { id: 'b7', kind, columns },
      content: [row(['CHAN', '', '', ''], 'head'), ...rows.map((each) => row(each))],
    },
  ],
});
// The maritime plan: ITU Radio Regulations, Appendix 18; crystal = (carrier - 10.7) / 9.
const printed = [
  ['12', '156.600', '16.211111', 'PORT'],
  ['16', '156.800', '16.233333', 'CALLING'],
];

describe('a channel table of a page', () => {
  it('can be looked into by formulas, under the name of its caption and its headings', () => {
    const [table] = channelTablesOf(page('channel', printed), '5-3');
    expect(table).toMatchObject({
      id: 'table-5-2',
      key: { name: 'channel', unit: '' },
      columns: [
        { name: 'carrier', unit: 'mc' },
        { name: 'crystal', unit: 'mc' },
      ],
      left: [],
    });
    const program = compile(
      [
        { symbol: 'channel', label: '', kind: 'input', unit: '', home: 12 },
        {
          symbol: 'crystal',
          label: '',
          kind: 'derived',
          unit: 'mc',
          expression: 'lookup("table-5-2", channel, "crystal")',
        },
      ],
      table === undefined ? [] : [table],
    );
    expect(evaluate(program, { channel: 16 }).values['crystal']?.value).toBe(16.233333);
  });

  it('leaves out rows that it cannot take, and says why', () => {
    const rows = [
      ...printed,
      ['16', '156.800', '16.233333', ''],
      ['17A', '156.850', '16.238889', ''],
      ['', '', '', ''],
    ];
    const [table] = channelTablesOf(
      page('channel', [...rows, ...printed.map(([n, ...rest]) => [`${Number(n) + 60}`, ...rest])]),
      '5-3',
    );
    expect(table?.rows.map(([key]) => key)).toEqual([12, 16, 72, 76]);
    expect(table?.left).toEqual(['16: stands in the table twice', '17A: no number for a key']);
  });

  it('is only what an editor has tagged as one', () => {
    expect(channelTablesOf(page('table', printed), '5-3')).toEqual([]);
  });
});
