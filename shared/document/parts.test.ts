import { describe, expect, it } from 'vitest';
import type { DocNode } from './define-block.ts';
import { block, doc, paragraph, text } from './documents.fixture.ts';
import { partsOfManual } from './parts-of-manual.ts';
import { partsOf } from './parts.ts';

const cell = (words: string): DocNode => block('tableCell', {}, words === '' ? paragraph() : paragraph(text(words)));
const meanings = ['refDes', 'description', 'partNumber', 'quantity'];
const list = (...rows: string[][]): DocNode =>
  doc(
    block(
      'table',
      { id: 't', kind: 'parts', columns: meanings.map((meaning) => ({ heading: '', meaning })) },
      ...rows.map((cells) => block('tableRow', { role: 'body' }, ...cells.map(cell))),
    ),
  );

describe('a parts list', () => {
  it('writes ranges of designators out and holds the quantity to them', () => {
    const [range, pair] = partsOf(list(['R1-R3', 'Grid, 100K', '41-5470', '4'], ['V1A, V1B', 'Diode', '50-1', '1']));
    expect(range).toMatchObject({
      designators: ['R1', 'R2', 'R3'],
      problems: ['The quantity is 4, but 3 designators are named.'],
    });
    expect(pair?.problems).toEqual([]);
  });

  it.each(['"', "''", 'do.', '-do-', 'Ditto', '\u201d'])('takes %s for what stands above', (mark) => {
    const parts = partsOf(list(['C1', 'Mica, 47 \u00b5\u00b5f', '22-1470', '1'], ['C2', mark, mark, '1']));
    expect(parts[1]).toMatchObject({
      description: 'Mica, 47 \u00b5\u00b5f',
      partNumber: '22-1470',
      value: { magnitude: 47 },
    });
  });

  it('goes on over a page with its ditto marks', () => {
    const pages = [
      { pageId: 'p1', label: '6-1', document: list(['C1', 'Mica, 47 \u00b5\u00b5f', '22-1470', '1']) },
      { pageId: 'p2', label: '6-2', document: list(['C2', '"', '"', '1']) },
    ];
    expect(partsOfManual(pages)[1]).toMatchObject({ partNumber: '22-1470', pageLabel: '6-2' });
  });

  it('gives a part that is the same as another the number and value of that one', () => {
    const pages = [
      {
        pageId: 'p1',
        label: '6-1',
        document: list(['C1', 'Mica, 47 \u00b5\u00b5f', '22-1470', '1'], ['C9', 'Same as C1', '', '1']),
      },
      { pageId: 'p2', label: '6-2', document: list(['C10', 'Same as C77', '', '1']) },
    ];
    const [, ninth, tenth] = partsOfManual(pages);
    expect(ninth).toMatchObject({ sameAs: 'C1', partNumber: '22-1470', value: { magnitude: 47 }, problems: [] });
    expect(tenth?.problems).toEqual(['It is said to be the same as C77, which is not listed.']);
  });

  it('says where a designator stands twice', () => {
    const pages = [
      { pageId: 'p1', label: '6-1', document: list(['R1-R3', 'Grid, 100K', '41-5470', '3']) },
      { pageId: 'p2', label: '6-2', document: list(['R2', 'Plate, 22K', '41-6223', '1']) },
    ];
    expect(partsOfManual(pages).map(({ problems }) => problems)).toEqual([
      ['R2 stands twice: also on page 6-2.'],
      ['R2 stands twice: also on page 6-1.'],
    ]);
  });
});
