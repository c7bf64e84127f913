import { describe, expect, it } from 'vitest';
import { flattened } from './audit-trail.tsx';

describe('the details of an entry of the audit trail', () => {
  it('stand one to a line, without what says nothing', () => {
    const change = { symbol: 'carrier', home: null, printed: { text: '156.600 mc' } };
    expect(flattened({ manualId: 'x', pageCount: 6, change })).toEqual([
      ['page count', '6'],
      ['symbol', 'carrier'],
      ['printed, text', '156.600 mc'],
    ]);
  });
});
