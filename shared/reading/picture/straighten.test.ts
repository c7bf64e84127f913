import { describe, expect, it } from 'vitest';
import { drawnAnew } from './straighten.ts';

const picture = { width: 4, height: 3, data: Uint8Array.from([0, 40, 80, 120, 10, 50, 90, 130, 20, 60, 100, 140]) };
const moved = (x: number, y: number): [[number, number, number], [number, number, number]] => [
  [1, 0, x],
  [0, 1, y],
];

describe('a picture drawn anew', () => {
  it('is itself where nothing moves, but for the rim that has no neighbours to mix with', () => {
    const { data } = drawnAnew(picture, picture, moved(0, 0));
    expect([...data]).toEqual([0, 40, 80, 255, 10, 50, 90, 255, 255, 255, 255, 255]);
  });

  it('mixes the four pixels around a place', () => {
    const { data } = drawnAnew(picture, { width: 1, height: 1 }, moved(0.5, 0.5));
    expect([...data]).toEqual([(0 + 40 + 10 + 50) / 4]);
  });

  it('is white outside', () => {
    expect([...drawnAnew(picture, { width: 2, height: 1 }, moved(9, 0)).data]).toEqual([255, 255]);
  });
});
