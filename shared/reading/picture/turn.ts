import type { Transform } from '../reading.ts';
import type { GreyPicture } from './grey.ts';

/** Quarter turns of a sheet, clockwise, in degrees. */
export const turns = [0, 90, 180, 270] as const;
export type Turn = (typeof turns)[number];

export const isQuarter = (turn: Turn): boolean => turn === 90 || turn === 270;

/** The picture turned clockwise. */
export function turned(picture: GreyPicture, turn: Turn): GreyPicture {
  if (turn === 0) return picture;
  const { width, height, data } = picture;
  const [w, h] = isQuarter(turn) ? [height, width] : [width, height];
  const [[a, b, c], [d, e, f]] = backFrom(turn, { width: width - 1, height: height - 1 });
  const out = new Uint8Array(w * h);
  for (let y = 0; y < h; y += 1) {
    for (let x = 0; x < w; x += 1) out[y * w + x] = data[(d * x + e * y + f) * width + a * x + b * y + c] ?? 255;
  }
  return { width: w, height: h, data: out };
}

/** Takes a point of the turned sheet to the same point of the sheet as it lay; `size` is the sheet's before the turn. */
export function backFrom(turn: Turn, { width, height }: { width: number; height: number }): Transform {
  const rows: Record<Turn, Transform> = {
    0: [
      [1, 0, 0],
      [0, 1, 0],
    ],
    90: [
      [0, 1, 0],
      [-1, 0, height],
    ],
    180: [
      [-1, 0, width],
      [0, -1, height],
    ],
    270: [
      [0, -1, width],
      [1, 0, 0],
    ],
  };
  return rows[turn];
}

/** Does `first`, then `then`. */
export function composed([p, q]: Transform, [[a, b, c], [d, e, f]]: Transform): Transform {
  const row = (m: number, n: number, o: number): [number, number, number] => [
    m * p[0] + n * q[0],
    m * p[1] + n * q[1],
    m * p[2] + n * q[2] + o,
  ];
  return [row(a, b, c), row(d, e, f)];
}
