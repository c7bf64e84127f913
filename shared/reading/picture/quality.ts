import { type GreyPicture, inkThreshold } from './grey.ts';

/**
 * What can be said of a scan before it is read. `contrast`: paper less ink, of 255. `paperSpread`: how far the paper's
 * level differs over the page, of 255. `edgePixels`: how many pixels the step from paper to ink takes.
 * `specksPerSquareInch`: dark spots of at most three pixels standing alone. `inkShare`: of the page's pixels.
 */
export type PictureQuality = {
  contrast: number;
  paperSpread: number;
  edgePixels: number;
  specksPerSquareInch: number;
  inkShare: number;
};

/** One row in so many is looked at: enough of a page, at a quarter of the time. */
const rowStep = 4;

/** Measures a picture as scanned (`grey`) and the same made even; resolution in dots an inch. */
export function pictureQuality(grey: GreyPicture, even: GreyPicture, dpi: number): PictureQuality {
  const threshold = inkThreshold(even);
  const [ink, paper] = levelsOf(grey, even, threshold);
  const { width, height } = grey;
  const squareInches = (width * height) / (dpi * dpi);
  const dark = ink.reduce((sum, count) => sum + count, 0);
  return {
    contrast: levelAt(paper, 0.5) - levelAt(ink, 0.5),
    paperSpread: levelAt(paper, 0.95) - levelAt(paper, 0.05),
    edgePixels: edgeLength(even, threshold),
    specksPerSquareInch: (specks(even, threshold) * rowStep) / squareInches,
    inkShare: (dark * rowStep) / (width * height),
  };
}

/** How often each level of the scan stands where there is ink, and where there is paper. */
function levelsOf(grey: GreyPicture, even: GreyPicture, threshold: number): [Uint32Array, Uint32Array] {
  const [ink, paper] = [new Uint32Array(256), new Uint32Array(256)];
  for (let y = 0; y < grey.height; y += rowStep) {
    for (let at = y * grey.width; at < (y + 1) * grey.width; at += 1) {
      const side = (even.data[at] ?? 255) <= threshold ? ink : paper;
      const level = grey.data[at] ?? 255;
      side[level] = (side[level] ?? 0) + 1;
    }
  }
  return [ink, paper];
}

/** The level that this share of the pixels does not exceed. */
function levelAt(counts: Uint32Array, share: number): number {
  const wanted = counts.reduce((sum, count) => sum + count, 0) * share;
  let below = 0;
  for (let level = 0; level < 256; level += 1) {
    below += counts[level] ?? 0;
    if (below >= wanted && below > 0) return level;
  }
  return 255;
}

/** The mean number of pixels from the last that is clearly paper to the first that is clearly ink, along rows; 0 without ink. */
function edgeLength({ width, height, data }: GreyPicture, threshold: number): number {
  const clearlyPaper = 255 - (255 - threshold) * 0.4;
  const clearlyInk = threshold * 0.6;
  let [edges, pixels] = [0, 0];
  for (let y = 0; y < height; y += rowStep) {
    let paperAt = -1;
    for (let x = 0; x < width; x += 1) {
      const level = data[y * width + x] ?? 255;
      if (level >= clearlyPaper) paperAt = x;
      else if (level <= clearlyInk && paperAt >= 0) {
        edges += 1;
        pixels += x - paperAt;
        paperAt = -1;
      }
    }
  }
  return edges === 0 ? 0 : pixels / edges;
}

/** Dark pixels in the rows looked at with nothing dark on the ring two pixels away. */
function specks({ width, height, data }: GreyPicture, threshold: number): number {
  let count = 0;
  for (let y = 2; y < height - 2; y += rowStep) {
    for (let x = 2; x < width - 2; x += 1) {
      if ((data[y * width + x] ?? 255) > threshold) continue;
      if (isAlone(data, { at: y * width + x, width, threshold })) count += 1;
    }
  }
  return count;
}

function isAlone(
  data: Uint8Array,
  { at, width, threshold }: { at: number; width: number; threshold: number },
): boolean {
  for (let side = -2; side <= 2; side += 1) {
    const ring = [at - 2 * width + side, at + 2 * width + side, at + side * width - 2, at + side * width + 2];
    if (ring.some((near) => (data[near] ?? 255) <= threshold)) return false;
  }
  return true;
}
