import type { GreyPicture } from './grey.ts';

const tile = 32;
/** Paper is lighter than ink and covers most of a page: this share of a tile's pixels is darker than its paper. */
const paperShare = 0.8;
/** A little above white, so that the paper comes out even and what is painted out does not stand against it. */
const paperAfterwards = 262;

/**
 * Evens out stains, fading and shadow: the paper's level is found tile by tile and every pixel is set against it.
 * Tile, share and the lightest of nine neighbours come from trials on generated scans of 300 dots an inch.
 */
export function flatten({ width, height, data }: GreyPicture): GreyPicture {
  const across = Math.ceil(width / tile);
  const down = Math.ceil(height / tile);
  const levels = new Float64Array(across * down);
  for (let ty = 0; ty < down; ty += 1) {
    for (let tx = 0; tx < across; tx += 1) levels[ty * across + tx] = paperLevel({ width, height, data }, tx, ty);
  }
  const paper = lightestAround(levels, across, down);
  const flat = new Uint8Array(width * height);
  for (let y = 0; y < height; y += 1) fillRow({ width, data, flat }, y, rowLevels(paper, { across, down }, y));
  return { width, height, data: flat };
}

function paperLevel({ width, height, data }: GreyPicture, tx: number, ty: number): number {
  const counts = new Uint32Array(256);
  let seen = 0;
  for (let y = ty * tile; y < Math.min(height, (ty + 1) * tile); y += 2) {
    for (let x = tx * tile; x < Math.min(width, (tx + 1) * tile); x += 2) {
      const level = data[y * width + x] ?? 255;
      counts[level] = (counts[level] ?? 0) + 1;
      seen += 1;
    }
  }
  let below = 0;
  for (let level = 0; level < 256; level += 1) {
    below += counts[level] ?? 0;
    if (below >= seen * paperShare) return level;
  }
  return 255;
}

/** A tile full of ink has no paper of its own to show: the lightest of its neighbours speaks for it. */
function lightestAround(levels: Float64Array, across: number, down: number): Float64Array {
  return levels.map((_, index) => {
    const [tx, ty] = [index % across, Math.floor(index / across)];
    let lightest = 32;
    for (let y = Math.max(0, ty - 1); y <= Math.min(down - 1, ty + 1); y += 1) {
      for (let x = Math.max(0, tx - 1); x <= Math.min(across - 1, tx + 1); x += 1) {
        lightest = Math.max(lightest, levels[y * across + x] ?? 0);
      }
    }
    return lightest;
  });
}

/** The paper's level along one row of tiles' centres, between the rows of tiles above and below. */
function rowLevels(paper: Float64Array, { across, down }: { across: number; down: number }, y: number): Float64Array {
  const at = Math.min(down - 1, Math.max(0, y / tile - 0.5));
  const above = Math.floor(at);
  const below = Math.min(down - 1, above + 1);
  const share = at - above;
  const row = new Float64Array(across);
  for (let tx = 0; tx < across; tx += 1) {
    row[tx] = (paper[above * across + tx] ?? 255) * (1 - share) + (paper[below * across + tx] ?? 255) * share;
  }
  return row;
}

function fillRow(
  { width, data, flat }: { width: number; data: Uint8Array; flat: Uint8Array },
  y: number,
  levels: Float64Array,
): void {
  const last = levels.length - 1;
  for (let x = 0; x < width; x += 1) {
    const at = Math.min(last, Math.max(0, x / tile - 0.5));
    const left = Math.floor(at);
    const share = at - left;
    const level = (levels[left] ?? 255) * (1 - share) + (levels[Math.min(last, left + 1)] ?? 255) * share;
    flat[y * width + x] = Math.min(255, ((data[y * width + x] ?? 255) * paperAfterwards) / level);
  }
}
