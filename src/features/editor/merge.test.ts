import { describe, expect, it } from 'vitest';
import type { DocNode } from '#shared/document/define-block.ts';
import { mergedDocument, mergeDocuments, type Side } from './merge.ts';

const block = (id: string, text: string): DocNode => ({
  type: 'paragraph',
  attrs: { id },
  content: [{ type: 'text', text }],
});
const doc = (...content: DocNode[]): DocNode => ({ type: 'doc', content });
const base = doc(block('a', 'One'), block('b', 'Two'), block('c', 'Three'));
const texts = (document: DocNode | null): string[] | undefined =>
  document?.content?.map(({ content }) => content?.[0]?.text ?? '');
const merge = (mine: DocNode, theirs: DocNode, choices: Record<string, Side> = {}) =>
  texts(mergedDocument(mergeDocuments(base, mine, theirs), choices, base));

describe('two people who saved one page', () => {
  it('both keep what they changed in different blocks', () => {
    expect(
      merge(
        doc(block('a', 'One!'), block('b', 'Two'), block('c', 'Three')),
        doc(block('a', 'One'), block('b', 'Two'), block('c', 'Three?')),
      ),
    ).toEqual(['One!', 'Two', 'Three?']);
  });

  it('are asked where both changed one block, and nothing is decided for them', () => {
    const mine = doc(block('a', 'One'), block('b', 'Mine'), block('c', 'Three'));
    const theirs = doc(block('a', 'One'), block('b', 'Theirs'), block('c', 'Three'));
    expect(merge(mine, theirs)).toBeUndefined();
    expect(merge(mine, theirs, { b: 'mine' })).toEqual(['One', 'Mine', 'Three']);
    expect(merge(mine, theirs, { b: 'theirs' })).toEqual(['One', 'Theirs', 'Three']);
  });

  it('keep the blocks that either added, where they were added', () => {
    const mine = doc(block('a', 'One'), block('m', 'My own'), block('b', 'Two'), block('c', 'Three'));
    const theirs = doc(block('a', 'One'), block('b', 'Two'), block('t', 'Theirs'), block('c', 'Three'));
    expect(merge(mine, theirs)).toEqual(['One', 'My own', 'Two', 'Theirs', 'Three']);
  });

  it('lose a block that one deleted and the other left alone, but are asked when the other changed it', () => {
    expect(merge(doc(block('a', 'One'), block('c', 'Three')), base)).toEqual(['One', 'Three']);
    const changed = doc(block('a', 'One'), block('b', 'Two, changed'), block('c', 'Three'));
    expect(merge(doc(block('a', 'One'), block('c', 'Three')), changed)).toBeUndefined();
    expect(merge(doc(block('a', 'One'), block('c', 'Three')), changed, { b: 'theirs' })).toEqual([
      'One',
      'Two, changed',
      'Three',
    ]);
  });
});
