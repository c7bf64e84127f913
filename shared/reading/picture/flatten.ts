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
  const counts = new Uint32Array(256);
  for (let ty = 0; ty < down; ty += 1) {
    for (let tx = 0; tx < across; tx += 1)
      levels[ty * across + tx] = paperLevel({ width, height, data }, { tx, ty }, counts);
  }
  const gains = lightestAround(levels, across, down).map((level) => paperAfterwards / level);
  const flat = new Uint8Array(width * height);
  for (let y = 0; y < height; y += 1) fillRow({ width, data, flat }, y, rowGains(gains, { across, down }, y));
  return { width, height, data: flat };
}

/** `counts` is room to count in, used again for every tile. */
function paperLevel(
  { width, height, data }: GreyPicture,
  { tx, ty }: { tx: number; ty: number },
  counts: Uint32Array,
): number {
  counts.fill(0);
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

/** What pixels are multiplied by along one row, at the tiles' centres: between the rows of tiles above and below. */
function rowGains(gains: Float64Array, { across, down }: { across: number; down: number }, y: number): Float64Array {
  const at = Math.min(down - 1, Math.max(0, y / tile - 0.5));
  const above = Math.floor(at);
  const below = Math.min(down - 1, above + 1);
  const share = at - above;
  const row = new Float64Array(across);
  for (let tx = 0; tx < across; tx += 1) {
    row[tx] = (gains[above * across + tx] ?? 1) * (1 - share) + (gains[below * across + tx] ?? 1) * share;
  }
  return row;
}

/** From the centre of one tile to that of the next the gain changes evenly, so the inner loop only adds and multiplies. */
function fillRow(
  { width, data, flat }: { width: number; data: Uint8Array; flat: Uint8Array },
  y: number,
  gains: Float64Array,
): void {
  const row = y * width;
  for (let tx = -1; tx < gains.length; tx += 1) {
    const from = gains[Math.max(0, tx)] ?? 1;
    const step = ((gains[Math.min(gains.length - 1, tx + 1)] ?? 1) - from) / tile;
    const start = tx * tile + tile / 2;
    const end = row + Math.min(width, start + tile);
    let at = row + Math.max(0, start);
    for (let gain = from + (at - row - start) * step; at < end; at += 1, gain += step) {
      const level = (data[at] ?? 255) * gain;
      flat[at] = level > 255 ? 255 : level;
    }
  }
}
