import { describe, expect, it } from 'vitest';
import { compile } from './program.ts';
import { proof } from './proof.ts';
import { derived, input } from './sample-quantities.fixture.ts';

describe('the proof', () => {
  it('lists what disagrees and what cannot be computed', () => {
    const faulty = compile([
      input('a1', { unit: 'mc', home: 10.7, printed: { text: '10.7 mc' } }),
      derived('b1', 'a1 / 9', { unit: 'mc', printed: { text: '1.188 mc' } }),
      derived('c1', 'a1 / 9', { unit: 'mc', printed: { text: '1189 kc' } }),
      derived('d1', 'a1 / 0', { unit: 'mc', printed: { text: '1 mc' } }),
      derived('e1', 'a1', { unit: 'mc', printed: { text: 'see note' } }),
      derived('f1', 'a1', { unit: 'mc', printed: { text: '10 to 11 mc' } }),
      derived('g1', 'a1', { unit: 'mc', printed: { text: '10.7 v' } }),
    ]);
    const { holds, items } = proof(faulty);
    expect(holds).toBe(false);
    expect(items.map(({ symbol, agrees }) => [symbol, agrees])).toEqual([
      ['a1', true],
      ['b1', false],
      ['c1', true],
      ['d1', false],
      ['e1', false],
      ['f1', true],
      ['g1', false],
    ]);
    expect(items[1]).toMatchObject({ computed: '1.189 mc' });
    expect(items[3]).toMatchObject({ computed: '', problem: { code: 'division-by-zero' } });
  });
});
