import { describe, expect, it } from 'vitest';
import { middleOf, zoneUnderRect } from './mark-place.tsx';

const page = { width: 1000, height: 1400 };

describe('a place marked on the screen', () => {
  it('is the same place of the page, however far off it is looked at', () => {
    const rect = { left: 60, top: 120, width: 50, height: 25 };
    expect(zoneUnderRect(rect, { x: 10, y: 20, scale: 0.5 }, page)).toEqual([100, 200, 100, 50]);
  });

  it('ends where the page ends', () => {
    const rect = { left: -20, top: -20, width: 60, height: 60 };
    expect(zoneUnderRect(rect, { x: 0, y: 0, scale: 1 }, page)).toEqual([0, 0, 40, 40]);
  });

  it('is none beside the page', () => {
    const rect = { left: 0, top: 0, width: 40, height: 40 };
    expect(zoneUnderRect(rect, { x: 100, y: 0, scale: 1 }, page)).toBeNull();
  });

  it('lies in the middle when the keys choose it', () => {
    expect(middleOf({ width: 100, height: 100 })).toEqual({ left: 30, top: 37.5, width: 40, height: 25 });
  });
});
