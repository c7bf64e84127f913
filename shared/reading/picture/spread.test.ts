import { describe, expect, it } from 'vitest';
import { type GreyPicture, blankPicture } from './grey.ts';
import { gutterOf } from './spread.ts';

/** Lines of print as rows of dark dashes, between two columns of pixels. */
function print(picture: GreyPicture, left: number, right: number): void {
  for (let y = 120; y < picture.height - 120; y += 16)
    for (let x = left; x < right; x += 1)
      if (x % 7 < 5) picture.data.fill(20, y * picture.width + x, y * picture.width + x + 1);
}
const sheet = (width: number, height: number): GreyPicture => blankPicture(width, height);

describe('a double-page spread', () => {
  it('is divided between its two columns of print', () => {
    const spread = sheet(1700, 1100);
    print(spread, 100, 760);
    print(spread, 900, 1600);
    expect(gutterOf(spread, 100)).toBeCloseTo(830 / 1700, 2);
  });

  it('is still one when the fold throws a shadow', () => {
    const spread = sheet(1700, 1100);
    print(spread, 100, 760);
    print(spread, 900, 1600);
    for (let y = 0; y < 1100; y += 1) spread.data.fill(90, y * 1700 + 840, y * 1700 + 860);
    expect(gutterOf(spread, 100)).toBeCloseTo(0.49, 1);
  });

  it('is no upright page of two columns, and no landscape table', () => {
    const page = sheet(850, 1100);
    print(page, 80, 380);
    print(page, 470, 780);
    expect(gutterOf(page, 100)).toBeNull();
    const landscape = sheet(1100, 850);
    for (const left of [80, 300, 520, 740, 900]) print(landscape, left, left + 150);
    expect(gutterOf(landscape, 100)).toBeNull();
  });

  it('has print on both of its pages', () => {
    const half = sheet(1700, 1100);
    print(half, 100, 760);
    expect(gutterOf(half, 100)).toBeNull();
  });
});
