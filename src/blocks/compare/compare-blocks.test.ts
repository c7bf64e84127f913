import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { canonical } from './canonical.ts';
import { compareDocuments, inOrder } from './compare-blocks.ts';

const paragraph = (id: string, text: string): DocNode => ({
  type: 'paragraph',
  attrs: { id },
  content: [{ type: 'text', text }],
});
const row = (...cells: string[]): DocNode => ({
  type: 'tableRow',
  content: cells.map((text) => ({
    type: 'tableCell',
    content: [{ type: 'paragraph', content: [{ type: 'text', text }] }],
  })),
});
const doc = (...content: DocNode[]): DocNode => ({ type: 'doc', content });

describe('two revisions side by side', () => {
  it('are compared word by word', () => {
    const [block] = compareDocuments(
      doc(paragraph('a', 'Tune L5 for 2.5 volts')),
      doc(paragraph('a', 'Tune L6 for 2.5 volts')),
    );
    expect(block?.change).toBe('changed');
    expect(block?.lines[0]?.filter(({ kind }) => kind !== 'same')).toEqual([
      { kind: 'gone', text: 'L5' },
      { kind: 'new', text: 'L6' },
    ]);
  });

  it('show a table by its rows', () => {
    const older: DocNode = {
      type: 'table',
      attrs: { id: 't' },
      content: [row('R1', '470'), row('R2', '100K'), row('R3', '1K')],
    };
    const newer: DocNode = {
      type: 'table',
      attrs: { id: 't' },
      content: [row('R1', '470'), row('R2', '120K'), row('R3', '1K'), row('R4', '2K')],
    };
    const kinds = compareDocuments(doc(older), doc(newer))[0]?.lines.map((pieces) =>
      [...new Set(pieces.map(({ kind }) => kind))].join(),
    );
    expect(kinds).toEqual(['same', 'same,gone,new', 'same', 'new']);
  });

  it('say what is new, what is gone and what only changed its form', () => {
    const before = doc(paragraph('a', 'One'), paragraph('b', 'Two'), paragraph('c', 'Three'));
    const after = doc(paragraph('a', 'One'), { ...paragraph('c', 'Three'), type: 'heading' }, paragraph('d', 'Four'));
    expect(compareDocuments(before, after).map(({ key, change }) => `${key} ${change}`)).toEqual([
      'a same',
      'b gone',
      'c form',
      'd new',
    ]);
  });

  it('keep what is gone behind what it stood behind', () => {
    expect(inOrder(['a', 'b', 'c', 'd'], ['a', 'd', 'e'])).toEqual(['a', 'b', 'c', 'd', 'e']);
  });
});

describe('the form in which documents are compared', () => {
  it('joins neighbouring text under the same marks, as the editor does', () => {
    const apart: DocNode = doc({
      type: 'paragraph',
      content: ['to', ' ', 'L5'].map((text) => ({ type: 'text', text })),
    });
    const together = doc({ type: 'paragraph', content: [{ type: 'text', text: 'to L5' }] });
    expect(JSON.stringify(canonical(apart))).toBe(JSON.stringify(canonical(together)));
  });
});
