import { describe, expect, it } from 'vitest';
import type { GreyPicture } from './grey.ts';
import { backFrom, composed, turned, turns } from './turn.ts';

const picture: GreyPicture = { width: 3, height: 2, data: new Uint8Array([1, 2, 3, 4, 5, 6]) };

describe('a quarter turn', () => {
  it.each([
    [90, [4, 1, 5, 2, 6, 3]],
    [180, [6, 5, 4, 3, 2, 1]],
    [270, [3, 6, 2, 5, 1, 4]],
  ] as const)('of %d degrees is clockwise', (turn, pixels) => {
    expect([...turned(picture, turn).data]).toEqual(pixels);
  });

  it.each(turns)('of %d degrees four times over is none', (turn) => {
    const four = [1, 2, 3, 4].reduce((each) => turned(each, turn), picture);
    expect([...four.data]).toEqual([...picture.data]);
  });

  it('is undone by its transform, before another', () => {
    const scale: [[number, number, number], [number, number, number]] = [
      [2, 0, 10],
      [0, 2, 20],
    ];
    // The upper left corner of a sheet of 300 by 200 turned clockwise was its lower left one.
    expect(composed(backFrom(90, { width: 300, height: 200 }), scale)).toEqual([
      [0, 2, 10],
      [-2, 0, 420],
    ]);
  });
});
