import type { GreyPicture } from './grey.ts';

/**
 * Every pixel becomes the middle one of the nine around it: specks go, edges stay. Each column of three is sorted once
 * and used by three pixels; the median of nine is then the median of (largest of the least, median of the middle,
 * least of the largest). Paper and the rim of one pixel are left as they are.
 */
export function medianFiltered({ width, height, data }: GreyPicture): GreyPicture {
  const out = data.slice();
  const stretches = Math.ceil(width / stretch);
  const isPaper = paperStretches({ width, height, data }, stretches);
  const sorted: Columns = { low: new Uint8Array(width), middle: new Uint8Array(width), high: new Uint8Array(width) };
  for (let y = 1; y < height - 1; y += 1) {
    for (let part = 0; part < stretches; part += 1) {
      const at = y * stretches + part;
      // Most of a page is even paper, which has no specks and needs no sorting.
      if (isPaper[at - stretches] === 1 && isPaper[at] === 1 && isPaper[at + stretches] === 1) continue;
      const [from, to] = [Math.max(1, part * stretch), Math.min(width - 1, (part + 1) * stretch)];
      sortColumns(data, { width, y, from, to }, sorted);
      fillPart(out, { width, y, from, to }, sorted);
    }
  }
  return { width, height, data: out };
}

/** What is lighter than this, of 255, is paper with its grain, on a page made even: no speck that anything reads. */
const paperAbove = 215;
/** Pixels of a row that are looked at together. */
const stretch = 8;

/** 1 for every stretch of a row that is paper throughout. */
function paperStretches({ width, height, data }: GreyPicture, stretches: number): Uint8Array {
  const isPaper = new Uint8Array(stretches * height);
  for (let y = 0, index = 0; y < height; y += 1) {
    const rowEnd = (y + 1) * width;
    for (let start = y * width; start < rowEnd; start += stretch, index += 1) {
      const end = Math.min(start + stretch, rowEnd);
      let next = start;
      while (next < end && (data[next] ?? 0) > paperAbove) next += 1;
      if (next === end) isPaper[index] = 1;
    }
  }
  return isPaper;
}

type Columns = Record<'low' | 'middle' | 'high', Uint8Array>;
type Part = { width: number; y: number; from: number; to: number };

const at = (data: Uint8Array, index: number): number => data[index] ?? 0;

function sortColumns(data: Uint8Array, { width, y, from, to }: Part, { low, middle, high }: Columns): void {
  const row = y * width;
  for (let x = from - 1; x <= to; x += 1) {
    const [a, b, c] = [at(data, row - width + x), at(data, row + x), at(data, row + width + x)];
    low[x] = least(a, b, c);
    middle[x] = middleOf(a, b, c);
    high[x] = greatest(a, b, c);
  }
}

function fillPart(out: Uint8Array, { width, y, from, to }: Part, { low, middle, high }: Columns): void {
  for (let x = from; x < to; x += 1) {
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
