import { describe, expect, it } from 'vitest';
import { blankPicture } from './grey.ts';
import { dpiByType } from './type-size.ts';

/** A page 1100 pixels high with so many letters, all of one height. */
function pageOf(count: number, height: number) {
  const page = blankPicture(800, 1100);
  for (let at = 0; at < count; at += 1) {
    const [x, y] = [50 + (at % 30) * 20, 50 + Math.floor(at / 30) * 30];
    for (let row = y; row < y + height; row += 1) page.data.fill(0, row * 800 + x, row * 800 + x + 6);
  }
  return page;
}

describe('the resolution of a page that does not tell it', () => {
  it('stays as guessed where the type has a usual size', () => {
    expect(dpiByType(pageOf(600, 8), 100)).toBe(100);
  });

  it('is higher where the type would be too large for a page of text: the sheet is smaller than was guessed', () => {
    expect(dpiByType(pageOf(600, 11), 100)).toBe(147);
  });

  it('says nothing on a page with few letters', () => {
    expect(dpiByType(pageOf(90, 11), 100)).toBe(100);
  });
});
