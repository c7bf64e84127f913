import { describe, expect, it } from 'vitest';
import { type GreyPicture, blankPicture } from './grey.ts';
import { pictureQuality } from './quality.ts';

/** Two inches square at 100 dots an inch, with upright strokes of this grey from row 20 to 180. */
function striped(ink: number, paper = 255): GreyPicture {
  const picture = blankPicture(200, 200);
  picture.data.fill(paper);
  for (let y = 20; y < 180; y += 1)
    for (let x = 20; x < 180; x += 10) picture.data.fill(ink, y * 200 + x, y * 200 + x + 4);
  return picture;
}

describe('the quality of a picture', () => {
  it('measures contrast on the scan and edges on the picture made even', () => {
    const quality = pictureQuality(striped(90, 200), striped(0), 100);
    expect(quality.contrast).toBe(110);
    expect(quality.edgePixels).toBe(1);
    expect(quality.specksPerSquareInch).toBe(0);
    expect(quality.inkShare).toBeCloseTo((160 * 16 * 4) / 40_000, 2);
  });

  it('finds wider edges where they are soft', () => {
    const soft = striped(0);
    for (let y = 20; y < 180; y += 1)
      for (let x = 20; x < 180; x += 10) {
        soft.data[y * 200 + x - 1] = 90;
        soft.data[y * 200 + x - 2] = 170;
      }
    expect(pictureQuality(soft, soft, 100).edgePixels).toBeGreaterThan(2);
  });

  it('counts specks that stand alone', () => {
    const dirty = striped(0);
    for (let x = 6; x < 196; x += 8) dirty.data[10 * 200 + x - 2] = 0;
    const { specksPerSquareInch } = pictureQuality(dirty, dirty, 100);
    expect(specksPerSquareInch).toBeGreaterThan(0);
  });
});
