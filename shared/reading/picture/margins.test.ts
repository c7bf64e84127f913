import { describe, expect, it } from 'vitest';
import { blankPicture } from './grey.ts';
import { unreadMargins } from './margins.ts';

describe('a page number that was not read', () => {
  const page = blankPicture(850, 1100);
  for (const [x, y] of [
    [400, 1050],
    [412, 1050],
    [424, 1050],
    [300, 500],
    [312, 500],
  ] as const)
    for (let row = y; row < y + 9; row += 1) page.data.fill(40, row * 850 + x, row * 850 + x + 6);

  it('is found at the foot of the page', () => {
    expect(unreadMargins(page, 100, [[300, 500, 20, 9]])).toEqual([[400, 1050, 30, 9]]);
  });

  it('is not looked for where words were read', () => {
    expect(unreadMargins(page, 100, [[400, 1050, 30, 9]])).toEqual([]);
  });
});
