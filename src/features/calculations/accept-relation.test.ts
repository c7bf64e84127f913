import { describe, expect, it } from 'vitest';
import type { RelationProposal } from '#shared/api/calculations.ts';
import { namingsFor, quantitiesFor } from './accept-relation.ts';

const number = (id: string, text: string, label: string, symbol: string | null = null) => ({
  ...{ id, text, label, symbol },
  ...{ unit: 'MHz', pageId: 'p1', pageLabel: '5-1' },
});
const proposal: RelationProposal = {
  target: 'n3',
  expression: '(carrier - n2) / 9',
  filled: '16.211111 mc = (156.600 mc - 10.700 mc) / 9',
  says: '',
  score: 9,
  numbers: [
    number('n1', '156.600 mc', 'on', 'carrier'),
    number('n2', '10.700 mc', 'the first i-f is'),
    number('n3', '16.211111 mc', 'set the crystal to'),
  ],
  table: null,
};

describe('accepting a relation', () => {
  const namings = namingsFor(proposal, ['carrier', 'firstIf']);

  it('names the numbers that are no quantities yet, each otherwise than those there are', () => {
    expect(namings.map(({ symbol, isNew }) => [symbol, isNew])).toEqual([
      ['carrier', false],
      ['firstIf2', true],
      ['setCrystal', true],
    ]);
  });

  it('adds what the formula rests on before what it gives, as printed', () => {
    expect(quantitiesFor(proposal, namings)).toMatchObject([
      { symbol: 'firstIf2', kind: 'constant', unit: 'mc', printed: { text: '10.700 mc' }, pageId: 'p1' },
      { symbol: 'setCrystal', kind: 'derived', unit: 'mc', expression: '(carrier - firstIf2) / 9' },
    ]);
  });
});
