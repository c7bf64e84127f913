import type { Zone } from '#shared/document/define-block.ts';
import { type GreyPicture, blankPicture } from '#shared/reading/picture/grey.ts';

/** Darker than half way from paper (white) to black. */
export const inkBelow = 128;
/** A run of ink so long, in heights of a figure, low under the figures of a cell is a line and no stroke of one. */
const underlineHeights = 1.25;
/** Above the line stands at least so much of a figure; and with the line the ink is higher than a figure by so much. */
const aboveUnderline = 0.85;
const withUnderline = 1.1;

/** The part of a picture inside a zone. */
export function cutOut(picture: GreyPicture, [x, y, width, height]: Zone): GreyPicture {
  const [left, top] = [Math.max(0, x), Math.max(0, y)];
  const [right, bottom] = [Math.min(picture.width, x + width), Math.min(picture.height, y + height)];
  const piece = blankPicture(Math.max(0, right - left), Math.max(0, bottom - top));
  for (let row = 0; row < piece.height; row += 1) {
    const from = (top + row) * picture.width + left;
    piece.data.set(picture.data.subarray(from, from + piece.width), row * piece.width);
  }
  return piece;
}

/** The same with the level that parts ink from paper brought half way: faded ink is ink too. */
export const evenly = ({ width, height, data }: GreyPicture, threshold: number): GreyPicture => ({
  width,
  height,
  data: data.map((level) =>
    level <= threshold
      ? (level * inkBelow) / (threshold + 1)
      : 255 - ((255 - level) * (255 - inkBelow)) / (255 - threshold),
  ),
});

/** The rows of a cell that hold the print through its middle: in a typed table the lines above and below reach into its box. */
export function middleBand(piece: GreyPicture): GreyPicture {
  const bands: { from: number; to: number }[] = [];
  longestRuns(piece).forEach((run, row) => {
    if (run === 0) return;
    const last = bands.at(-1);
    if (last?.to === row) last.to = row + 1;
    else bands.push({ from: row, to: row + 1 });
  });
  const middle = piece.height / 2;
  const weight = ({ from, to }: (typeof bands)[number]): number =>
    to - from - 2 * Math.max(0, from - middle, middle - to);
  const [best] = bands.sort((a, b) => weight(b) - weight(a));
  return best === undefined ? blankPicture(0, 0) : cutOut(piece, [0, best.from, piece.width, best.to - best.from]);
}

/** A cell without the line that is typed or ruled under its figures, whose feet may touch it. */
export function withoutUnderline(piece: GreyPicture, figureHeight: number): GreyPicture {
  if (piece.height < figureHeight * withUnderline) return piece;
  const line = longestRuns(piece).findIndex(
    (run, row) => row >= figureHeight * aboveUnderline && run >= figureHeight * underlineHeights,
  );
  // The upper edge of the line is soft.
  return line < 0 ? piece : cutOut(piece, [0, 0, piece.width, line - 1]);
}

/** The longest run of ink in each row. */
function longestRuns({ width, height, data }: GreyPicture): number[] {
  return Array.from({ length: height }, (_, row) => {
    let [longest, run] = [0, 0];
    for (let at = row * width; at < (row + 1) * width; at += 1) {
      run = (data[at] ?? 255) < inkBelow ? run + 1 : 0;
      longest = Math.max(longest, run);
    }
    return longest;
  });
}
