import { describe, expect, it } from 'vitest';
import { compareLists, isSame } from './compare-lists.ts';

describe('two lists held against each other', () => {
  it('say what is added, removed and changed', () => {
    const older = [
      { id: 'a', home: 12 },
      { id: 'b', home: 1 },
      { id: 'c', home: 5 },
    ];
    const newer = [
      { id: 'd', home: 2 },
      { home: 12, id: 'a' },
      { id: 'b', home: 3 },
    ];
    expect(compareLists(older, newer)).toEqual({
      added: [{ id: 'd', home: 2 }],
      removed: [{ id: 'c', home: 5 }],
      changed: [{ before: { id: 'b', home: 1 }, after: { id: 'b', home: 3 } }],
    });
  });

  it('are the same in whatever order properties were written, but not in another order of items', () => {
    expect(isSame({ a: { b: 1, c: [1, 2] } }, { a: { c: [1, 2], b: 1 } })).toBe(true);
    expect(isSame([1, 2], [2, 1])).toBe(false);
  });
});
