import { describe, expect, it } from 'vitest';
import type { DocNode } from './define-block.ts';
import { block, doc, partsTable, text } from './documents.fixture.ts';
import { restorePart } from './restore-part.ts';
import { tablesOf } from './tables.ts';
import { textOf } from './text-of.ts';

const named = (id: string, words: string): DocNode => block('paragraph', { id }, text(words));
const words = (page: DocNode) => (page.content ?? []).map(textOf);
const cellOf = (row: number, cell: number) => ({ from: [row, cell], to: [row, cell] }) as const;

/** The parts list with one cell of the row of C1 written anew. */
function changedTable(): DocNode {
  const table = structuredClone(partsTable());
  const cell = table.content?.[2]?.content?.[1];
  if (cell !== undefined) cell.content = [block('paragraph', {}, text('Mica, 74 µµf'))];
  return table;
}

describe('bringing one part of an older revision back', () => {
  it('puts a block in its place and leaves the others as they are', () => {
    const now = doc(named('a', 'One now'), named('b', 'Two now'));
    const restored = restorePart(now, doc(named('a', 'One'), named('b', 'Two')), { block: 'b' });
    expect(restored.ok && words(restored.value)).toEqual(['One now', 'Two']);
  });

  it('puts a block that is gone behind what it stood behind', () => {
    const older = doc(named('a', 'One'), named('b', 'Two'), named('c', 'Three'));
    const middle = restorePart(doc(named('a', 'One'), named('c', 'Three')), older, { block: 'b' });
    expect(middle.ok && words(middle.value)).toEqual(['One', 'Two', 'Three']);
    const top = restorePart(doc(named('c', 'Three')), older, { block: 'a' });
    expect(top.ok && words(top.value)).toEqual(['One', 'Three']);
  });

  it('brings back one cell of a table and no other', () => {
    const restored = restorePart(doc(changedTable()), doc(partsTable()), { block: 't1', cell: cellOf(2, 1) });
    expect(restored.ok && tablesOf(restored.value)[0]?.rows[0]).toEqual(['C1', 'Mica, 47 µµf ±5%', '22-1470', '1']);
    expect(restored.ok && restored.value).toEqual(doc(partsTable()));
  });

  it('says so where there is no such block or cell', () => {
    expect(restorePart(doc(named('a', 'One')), doc(named('a', 'One')), { block: 'x' }).ok).toBe(false);
    const short = doc(block('table', { id: 't1' }));
    expect(restorePart(short, doc(partsTable()), { block: 't1', cell: cellOf(2, 1) }).ok).toBe(false);
  });
});
