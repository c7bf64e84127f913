import type { Zone } from '#shared/document/define-block.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';

/** A patch is so many pixels wide and high. */
export const side = 16;
/** Behind the pixels: width, top and bottom of the ink, measured in heights of a capital. */
export const measures = 3;
export const inputs = side * side + measures;

/** Where the line that a glyph stands on lies: the foot of its letters and the height of its capitals, in pixels. */
export type LineMeasure = { baseline: number; capital: number };

/** Darker than half way from paper (white) to black. */
const inkBelow = 128;

/** The box of the ink inside a box; null where there is none. */
export function inkBox(picture: GreyPicture, [x, y, w, h]: Zone): Zone | null {
  let [left, right, top, bottom] = [Infinity, -1, Infinity, -1];
  for (let row = Math.max(0, y); row < Math.min(picture.height, y + h); row += 1) {
    for (let column = Math.max(0, x); column < Math.min(picture.width, x + w); column += 1) {
      if ((picture.data[row * picture.width + column] ?? 255) >= inkBelow) continue;
      left = Math.min(left, column);
      right = Math.max(right, column);
      top = Math.min(top, row);
      bottom = Math.max(bottom, row);
    }
  }
  return right < 0 ? null : [left, top, right - left + 1, bottom - top + 1];
}

/**
 * What the classifier is given for the glyph whose ink fills `box`: its darkness from 0 to 1 in a square of 16 by 16
 * pixels, the longer side filling it, and where on its line it stands.
 */
export function patchOf(picture: GreyPicture, box: Zone, { baseline, capital }: LineMeasure): Float32Array {
  const [x, y, w, h] = box;
  const patch = new Float32Array(inputs);
  const step = Math.max(w, h) / side;
  const [left, top] = [x + w / 2 - (side / 2) * step, y + h / 2 - (side / 2) * step];
  let darkest = 0.2;
  for (let row = 0; row < side; row += 1) {
    for (let column = 0; column < side; column += 1) {
      const dark = darkness(picture, [left + column * step, top + row * step, step, step], box);
      patch[row * side + column] = dark;
      darkest = Math.max(darkest, dark);
    }
  }
  for (let at = 0; at < side * side; at += 1) patch[at] = (patch[at] ?? 0) / darkest;
  patch.set([w / capital - 0.6, (baseline - y) / capital - 0.8, (baseline - y - h) / capital], side * side);
  return patch;
}

/** The mean darkness of an area that need not begin or end with a pixel; what lies beside the glyph's box is paper. */
function darkness({ width, data }: GreyPicture, [x, y, w, h]: Zone, [bx, by, bw, bh]: Zone): number {
  let sum = 0;
  for (let row = Math.max(by, Math.floor(y)); row < Math.min(by + bh, y + h); row += 1) {
    const tall = Math.min(row + 1, y + h) - Math.max(row, y);
    for (let column = Math.max(bx, Math.floor(x)); column < Math.min(bx + bw, x + w); column += 1) {
      const wide = Math.min(column + 1, x + w) - Math.max(column, x);
      sum += tall * wide * (255 - (data[row * width + column] ?? 255));
    }
  }
  return sum / (255 * w * h);
}
