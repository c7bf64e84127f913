import { describe, expect, it } from 'vitest';
import { blockAuthors } from './block-authors.ts';
import type { DocNode } from './define-block.ts';
import { block, doc, paragraph, text, word } from './documents.fixture.ts';

const named = (id: string, words: string): DocNode => block('paragraph', { id }, text(words));
const numbered = (...documents: DocNode[]) => documents.map((document, at) => ({ number: at + 1, document }));
const authors = (...documents: DocNode[]) =>
  blockAuthors(numbered(...documents)).map(({ block: key, revision }) => `${key} ${revision.number}`);

describe('who wrote each block', () => {
  it('is the last revision in which its text changed', () => {
    expect(
      authors(
        doc(named('a', 'One'), named('b', 'Two')),
        doc(named('a', 'One'), named('b', 'Too')),
        doc(named('a', 'One'), named('b', 'Too'), named('c', 'Three')),
      ),
    ).toEqual(['a 1', 'b 2', 'c 3']);
  });

  it('is not who moved it, or changed only its marks', () => {
    expect(
      authors(
        doc(named('a', 'One'), named('b', 'Two')),
        doc(block('paragraph', { id: 'b' }, word('Two')), named('a', 'One')),
      ),
    ).toEqual(['b 1', 'a 1']);
  });

  it('is who brought it back after it was gone', () => {
    expect(
      authors(
        doc(named('a', 'One'), named('b', 'Two')),
        doc(named('a', 'One')),
        doc(named('a', 'One'), named('b', 'Two')),
      ),
    ).toEqual(['a 1', 'b 3']);
  });

  it('is known by the words where a block has no name', () => {
    expect(authors(doc(paragraph(text('One'))), doc(paragraph(text('New')), paragraph(text('One'))))).toEqual([
      'at-0 2',
      'at-1 1',
    ]);
  });

  it('of a page without revisions is nobody', () => {
    expect(blockAuthors([])).toEqual([]);
  });
});
