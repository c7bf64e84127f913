import type { Zone } from '#shared/document/define-block.ts';
import { inkBox } from '#shared/reading/glyphs/patch.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { inkBelow } from './piece.ts';

/** Lower than this, in heights of a figure, is a point, a comma or a speck. */
const leastHeight = 0.6;
/** How far from its even place a cut between touching figures may lie, as a share of a figure's width. */
const slack = 0.28;
/** What a cut that far out must have less of ink than one in the even place. */
const outerCost = 0.3;

/** How high the figures of a table are, and how far it is from one to the next, in pixels. */
export type DigitSize = { height: number; pitch: number };

/** The figures of a cell from left to right, each as the box of its ink. */
export const digitBoxes = (piece: GreyPicture, { height, pitch }: DigitSize): Zone[] =>
  inkStretches(piece)
    .filter(([, , , h]) => h >= leastHeight * height)
    .flatMap((stretch) => parted(piece, stretch, Math.max(1, Math.round(stretch[2] / pitch + narrower))))
    .flatMap((part) => {
      const box = inkBox(piece, part);
      return box === null ? [] : [box];
    });

/** The ink of some figures is narrower than their pitches by the gap that they share. */
const narrower = 0.08;

/** Stretches of columns that hold ink, with the rows that it fills. */
export function inkStretches(piece: GreyPicture): Zone[] {
  const { width, height, data } = piece;
  const stretches: Zone[] = [];
  let start = -1;
  for (let x = 0; x <= width; x += 1) {
    let hasInk = false;
    for (let at = x; x < width && at < width * height && !hasInk; at += width) hasInk = (data[at] ?? 255) < inkBelow;
    if (hasInk && start < 0) start = x;
    if (hasInk || start < 0) continue;
    const box = inkBox(piece, [start, 0, x - start, height]);
    if (box !== null) stretches.push(box);
    start = -1;
  }
  return stretches;
}

/** Parts touching figures where the least ink stands near the even places. */
function parted(piece: GreyPicture, [x, y, w, h]: Zone, count: number): Zone[] {
  const step = w / count;
  const inner = Array.from({ length: count - 1 }, (_, at) =>
    thinnest(piece, [x + (at + 1) * step, y, step * slack, h]),
  );
  const cuts = [x, ...inner, x + w];
  return cuts.slice(1).map((to, at) => [cuts[at] ?? x, y, to - (cuts[at] ?? x), h]);
}

/** The column with the least ink, no farther than `reach` from the middle. */
function thinnest({ width, data }: GreyPicture, [middle, top, reach, height]: Zone): number {
  let [best, least] = [Math.round(middle), Infinity];
  for (let x = Math.round(middle - reach); x <= middle + reach; x += 1) {
    let ink = 0;
    for (let row = top; row < top + height; row += 1) ink += 255 - (data[row * width + x] ?? 255);
    const cost = ink * (1 + (outerCost * Math.abs(x - middle)) / Math.max(1, reach));
    if (cost < least) [best, least] = [x, cost];
  }
  return best;
}

export const gridWidth = 18;
const gridHeight = 26;
/** So many rows of the grid are as high as a figure; the others are room to shift in. */
const figureRows = 20;

/** A figure's darkness, 0 to 1, on a grid that the size of its typeface sets; its ink stands in the middle. */
export function gridOf(piece: GreyPicture, box: Zone, height: number): Float32Array {
  const [x, y, w, h] = box;
  const step = height / figureRows;
  const [left, top] = [x + w / 2 - (gridWidth / 2) * step, y + h / 2 - (gridHeight / 2) * step];
  return Float32Array.from({ length: gridWidth * gridHeight }, (_, at) =>
    darkness(piece, [left + (at % gridWidth) * step, top + Math.floor(at / gridWidth) * step, step, step], box),
  );
}

/** The mean darkness of the pixels that an area touches; what lies beside the figure's box is paper. */
function darkness({ width, data }: GreyPicture, [left, top, w, h]: Zone, [x, y, bw, bh]: Zone): number {
  let [sum, count] = [0, 0];
  for (let row = Math.floor(top); row < top + h; row += 1) {
    for (let column = Math.floor(left); column < left + w; column += 1) {
      count += 1;
      if (row >= y && row < y + bh && column >= x && column < x + bw) sum += 255 - (data[row * width + column] ?? 255);
    }
  }
  return sum / (255 * count);
}
