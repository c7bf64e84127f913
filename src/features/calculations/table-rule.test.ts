import { describe, expect, it } from 'vitest';
import type { LookupTable } from '#shared/calc/tables.ts';
import { ruleOfColumn } from './table-rule.ts';

const table: LookupTable = {
  id: 't',
  title: 'Channels',
  source: 'Page 1-2',
  key: { name: 'channel', unit: '' },
  columns: [
    { name: 'remarks', unit: '' },
    { name: 'receive', unit: 'mc' },
  ],
  rows: [1, 2, 3, 4, 5].map((channel) => [channel, 0, channel === 4 ? 156.3 : 156 + channel * 0.05]),
};

describe('the rule behind a channel table', () => {
  it('is found in the column of frequencies, with the row that does not fit', () => {
    const rule = ruleOfColumn(table, 1);
    expect(rule?.pieces).toHaveLength(1);
    expect(rule?.exceptions.map(({ channel }) => channel)).toEqual([4]);
  });

  it('is none where the column holds no frequencies', () => expect(ruleOfColumn(table, 0)).toBeUndefined());
});
