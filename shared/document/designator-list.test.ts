import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { designatorsIn } from './designator-list.ts';

describe('a cell of designators', () => {
  it.each([
    ['C12', ['C12']],
    ['R1-R3, R7', ['R1', 'R2', 'R3', 'R7']],
    ['R1-3', ['R1', 'R2', 'R3']],
    ['C2,3', ['C2', 'C3']],
    ['L3, L4', ['L3', 'L4']],
    ['R1 thru R3', ['R1', 'R2', 'R3']],
    ['R1 through R2 and R9', ['R1', 'R2', 'R9']],
    ['V101A, V101B', ['V101A', 'V101B']],
    ['C4; C6', ['C4', 'C6']],
    ['T1 T2', ['T1', 'T2']],
    ['R1\u2013R2', ['R1', 'R2']],
  ])('"%s" names %j', (cell, names) => expect(designatorsIn(cell)).toEqual(names));

  it.each(['', 'Mica, 47', 'R5-R1', 'R1-C3', 'R1-R5000', '12', 'R1-R2-R3'])('"%s" is none', (cell) =>
    expect(designatorsIn(cell)).toBeNull(),
  );

  it('names as many as a range has, whatever the range', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 900 }), fc.integer({ min: 0, max: 99 }), (from, more) => {
        const names = designatorsIn(`R${from}-R${from + more}`);
        expect(names).toHaveLength(more + 1);
        expect(names?.at(-1)).toBe(`R${from + more}`);
      }),
    );
  });
});
