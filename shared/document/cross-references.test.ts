import { describe, expect, it } from 'vitest';
import { leadingStretches, openReferences, referencesIn, resolver, targetsOf } from './cross-references.ts';
import { block, doc, paragraph, partsTable, text, word } from './documents.fixture.ts';
import { partsOfManual } from './parts-of-manual.ts';

const pages = [
  {
    pageId: 'p1',
    label: '4-1',
    document: doc(
      block('heading', { id: 'h', level: 1, zone: [1, 2, 3, 4] }, text('SECTION 4. THEORY')),
      block('paragraph', { id: 'a' }, text('4-12. The first mixer. See figure 5-3 and Table 6-2.')),
      block('caption', { id: 'c', of: 'figure', zone: [5, 6, 7, 8] }, text('Figure 5-3. Injection chain')),
      paragraph(text('2 turns of wire')),
    ),
  },
  {
    pageId: 'p2',
    label: '5-1',
    document: doc(
      block(
        'step',
        { id: 's', marker: 'a.' },
        text('Set '),
        word('C1'),
        text(' (see paragraph '),
        word('4-12'),
        text(').'),
      ),
      paragraph(text('Refer to section 4, page 4-1, and to figure 9-9.')),
      partsTable(),
    ),
  },
];
const resolve = resolver(targetsOf(pages, partsOfManual(pages)));

describe('what a text points at', () => {
  it.each([
    ['see paragraph 4-12', 'paragraph 4-12'],
    ['(para. 5.1)', 'paragraph 5.1'],
    ['Section 4', 'paragraph 4'],
    ['figures 5-3', 'figure 5-3'],
    ['FIG. 5-3A', 'figure 5-3a'],
    ['Table 6-2', 'table 6-2'],
    ['on page 6-3', 'page 6-3'],
    ['trimmer C20.', 'part C20'],
  ])('"%s" is %s', (words, expected) =>
    expect(referencesIn(words).map(({ kind, name }) => `${kind} ${name}`)).toEqual([expected]),
  );

  it('is nothing in plain words and values', () => {
    expect(referencesIn('Tune to 145.900 mc at 2.5 volts, turn page after page.')).toEqual([]);
  });

  it('is found in the manual: headings, numbered paragraphs, captions, pages and parts', () => {
    const at = (words: string) => resolve(referencesIn(words)[0]!)?.pageId;
    expect(['section 4', 'paragraph 4-12', 'figure 5-3', 'page 5-1', 'C3'].map(at)).toEqual([
      'p1',
      'p1',
      'p1',
      'p2',
      'p2',
    ]);
    expect(['figure 9-9', 'paragraph 2', 'C77'].map(at)).toEqual([undefined, undefined, undefined]);
  });

  it('is told where the manual has it not', () => {
    expect(openReferences(pages, resolve).map(({ pageLabel, text: what }) => `${pageLabel}: ${what}`)).toEqual([
      '4-1: table 6-2',
      '5-1: figure 9-9',
    ]);
  });

  it('stands in the very pieces of text that name it', () => {
    const [step] = pages[1]!.document.content!;
    const leading = leadingStretches(pages[1]!.document, resolve);
    expect(leading.get(step!.content![1]!)).toMatchObject([{ from: 0, to: 2, target: { kind: 'part', name: 'C1' } }]);
    expect(leading.get(step!.content![3]!)).toMatchObject([{ from: 0, to: 4, target: { name: '4-12', pageId: 'p1' } }]);
  });
});
