import { describe, expect, it } from 'vitest';
import type { Zone } from '#shared/document/define-block.ts';
import { wholeFigures } from './figure-zones.ts';
import { readWords } from './words.fixture.ts';

/** Lines stand 50 pixels apart from 400 down, words 30 pixels a letter from 300 on: see the fixture. */
const text = 'The drawing below shows the whole of the receiver section.';
const page = [
  text,
  '',
  '     R1                V1',
  '   220 K             MIXER',
  '',
  '     C2                         Q4',
  '',
  'Figure 4-7. Signal Path and Test Points',
  text,
];

describe('whole drawings', () => {
  it('take what was found in pieces, and their labels, up to the caption', () => {
    const pieces: Zone[] = [
      [400, 500, 500, 60],
      [400, 640, 500, 120],
    ];
    const [figure, ...more] = wholeFigures(pieces, readWords(page), 300);
    expect(more).toEqual([]);
    const [x, y, w, h] = figure ?? [0, 0, 0, 0];
    expect([x, y]).toEqual([390, 500]);
    expect(x + w).toBeGreaterThanOrEqual(300 + 34 * 30 - 4);
    expect(y + h).toBeLessThan(750);
  });

  it('are known by their captions where no stroke of them was found', () => {
    expect(wholeFigures([], readWords(page), 300)).toHaveLength(1);
  });

  it('are not made of text that stands close above a caption', () => {
    expect(wholeFigures([], readWords([text, text, 'Figure 4-7. Signal Path']), 300)).toEqual([]);
  });

  it('stay as found without a caption', () => {
    expect(wholeFigures([[400, 500, 500, 60]], readWords([text, '', 'R1']), 300)).toEqual([[400, 500, 500, 60]]);
  });
});
