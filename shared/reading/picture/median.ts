import type { GreyPicture } from './grey.ts';

/**
 * Every pixel becomes the middle one of the nine around it: specks go, edges stay. Each column of three is sorted once
 * and used by three pixels; the median of nine is then the median of (largest of the least, median of the middle,
 * least of the largest). The rim of one pixel is left as it is.
 */
export function medianFiltered({ width, height, data }: GreyPicture): GreyPicture {
  const out = Uint8Array.from(data);
  const sorted: Columns = { low: new Uint8Array(width), middle: new Uint8Array(width), high: new Uint8Array(width) };
  for (let y = 1; y < height - 1; y += 1) {
    sortColumns(data, { width, y }, sorted);
    fillRow(out, { width, y }, sorted);
  }
  return { width, height, data: out };
}

type Columns = Record<'low' | 'middle' | 'high', Uint8Array>;
type Row = { width: number; y: number };

const at = (data: Uint8Array, index: number): number => data[index] ?? 0;

function sortColumns(data: Uint8Array, { width, y }: Row, { low, middle, high }: Columns): void {
  const row = y * width;
  for (let x = 0; x < width; x += 1) {
    const [a, b, c] = [at(data, row - width + x), at(data, row + x), at(data, row + width + x)];
    low[x] = least(a, b, c);
    middle[x] = middleOf(a, b, c);
    high[x] = greatest(a, b, c);
  }
}

const white = 255;

/** `out` begins as a copy, so what is left alone stays. */
function fillRow(out: Uint8Array, { width, y }: Row, { low, middle, high }: Columns): void {
  for (let x = 1; x < width - 1; x += 1) {
    // Most of a page is even paper, where there is nothing to sort.
    if (at(low, x - 1) === white && at(low, x) === white && at(low, x + 1) === white) continue;
    out[y * width + x] = middleOf(
      greatest(at(low, x - 1), at(low, x), at(low, x + 1)),
      middleOf(at(middle, x - 1), at(middle, x), at(middle, x + 1)),
      least(at(high, x - 1), at(high, x), at(high, x + 1)),
    );
  }
}

const least = (a: number, b: number, c: number): number => (a < b ? (a < c ? a : c) : b < c ? b : c);
const greatest = (a: number, b: number, c: number): number => (a > b ? (a > c ? a : c) : b > c ? b : c);

function middleOf(a: number, b: number, c: number): number {
  if (a < b) return b < c ? b : a < c ? c : a;
  return a < c ? a : b < c ? c : b;
}
