import { describe, expect, it } from 'vitest';
import type { Quantity } from '#shared/api/quantities.ts';
import { changedFields, quantityLine } from './quantity-words.ts';

const channel: Quantity = { id: 'q', symbol: 'f', label: 'Channel', kind: 'input', unit: 'MHz', home: 156.6 };

describe('what changed of a quantity', () => {
  it('is told property by property, in words', () => {
    const after: Quantity = {
      ...channel,
      home: 156.65,
      printed: { text: '156.65 mc' },
      limits: { low: 156, high: 157 },
    };
    expect(changedFields(channel, after)).toEqual([
      { field: 'home value', before: '156.6 MHz', after: '156.65 MHz' },
      { field: 'as printed', before: 'none', after: '156.65 mc' },
      { field: 'limits', before: 'none', after: 'low 156, high 157' },
    ]);
  });

  it('is nothing where null and left out are all that differs', () => {
    expect(changedFields(channel, { ...channel, pageId: null })).toEqual([]);
  });

  it('is introduced by the formula of a derived one', () => {
    const { home: _home, ...rest } = channel;
    expect(quantityLine({ ...rest, kind: 'derived', expression: 'channel * 9' })).toBe('= channel * 9');
    expect(quantityLine(channel)).toBe('156.6 MHz');
  });
});
