import { describe, expect, it } from 'vitest';
import type { SearchHit } from '#shared/api/search.ts';
import { addressOfHit } from './hit.tsx';
import { cropAround } from './hit-crop.tsx';
import { byManual } from './results.tsx';

const hit = (change: Partial<SearchHit>): SearchHit => ({
  kind: 'text',
  manualId: 'hb',
  manualTitle: 'HB-12',
  pageId: 'p1',
  label: '4-1',
  snippet: '455 kc',
  marks: [],
  boxes: [[784, 746, 173, 36]],
  score: 1,
  ...change,
});

describe('search results', () => {
  it('stand under their manual, that of the best hit first', () => {
    const groups = byManual([hit({}), hit({ manualId: 'sg', manualTitle: 'SG-4' }), hit({ label: '5-1' })]);
    expect(groups.map(({ title, hits }) => [title, hits.length])).toEqual([
      ['HB-12', 2],
      ['SG-4', 1],
    ]);
  });

  it('lead to the page with the places to light up', () => {
    const address = addressOfHit(
      hit({
        boxes: [
          [1.4, 2, 3, 4],
          [5, 6, 7, 8],
        ],
      }),
      '455 kc',
    );
    expect(decodeURIComponent(address)).toBe('/pages/p1/read?boxes=1,2,3,4;5,6,7,8&q=455+kc');
  });

  it('lead to the list of values when a value stands on no page', () => {
    expect(addressOfHit(hit({ pageId: null, boxes: [] }), 'x')).toBe('/manuals/hb?view=values');
  });

  it('show the scan around the hit, never from beyond the edge', () => {
    const [x, y, width, height] = cropAround([784, 746, 173, 36]);
    expect(x).toBeLessThan(784);
    expect(x + width).toBeGreaterThan(784 + 173);
    expect(y + height).toBeGreaterThan(746 + 36);
    expect(cropAround([5, 5, 20, 20]).slice(0, 2)).toEqual([0, 0]);
  });
});
