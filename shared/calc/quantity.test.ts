import { describe, expect, it } from 'vitest';
import { quantityDefinition } from './quantity.ts';
import { derived, input } from './sample-quantities.fixture.ts';

describe('the schema of a quantity', () => {
  it.each([
    ['a derived one without expression', derived('a1', ' ')],
    ['a derived one with a home', derived('a1', '1', { home: 1 })],
    ['an input with an expression', input('a1', { expression: '1' })],
    ['a constant without a home', { symbol: 'a1', label: '', kind: 'constant', unit: '' }],
    ['an unknown unit', input('a1', { unit: 'furlong' })],
    ['a unit as symbol', input('kc')],
    ['limits the wrong way round', input('a1', { limits: { low: 2, high: 1 } })],
    ['a negative tolerance', input('a1', { tolerance: { kind: 'percent', plus: -1, minus: 1 } })],
  ])('refuses %s', (_, definition) => {
    expect(quantityDefinition.safeParse(definition).success).toBe(false);
  });
});
