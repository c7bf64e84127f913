import { type GreyPicture, inkOf } from './grey.ts';

/** A band of paper between two columns must be this wide and this clear. */
const narrowestGutterInches = 0.14;
const clearShare = 0.985;

/**
 * Whether the page is set in two columns: one clear band near the middle with dense text on both sides. A table has
 * several bands, and its columns are sparse. Give it a picture of about 100 dots an inch without its rules.
 */
export function hasTwoColumns(picture: GreyPicture, dpi: number): boolean {
  const { width } = picture;
  const ink = inkOf(picture);
  const body = bodyRows(picture, ink);
  if (body === null) return false;
  const clear = clearColumns(width, ink, body);
  const bands = bandsOf(clear, Math.round(narrowestGutterInches * dpi));
  const inner = bands.filter(({ start, end }) => start > width * 0.12 && end < width * 0.88);
  const [gutter] = inner;
  if (inner.length !== 1 || gutter === undefined) return false;
  const middle = (gutter.start + gutter.end) / 2 / width;
  return middle > 0.38 && middle < 0.62;
}

type Band = { start: number; end: number };

/** The rows between the running head and foot: the middle four fifths of what is inked. */
function bodyRows({ width, height }: GreyPicture, ink: Uint8Array): Band | null {
  const inked: number[] = [];
  for (let y = 0; y < height; y += 1) {
    let count = 0;
    for (let x = 0; x < width; x += 1) count += ink[y * width + x] ?? 0;
    if (count > width * 0.01) inked.push(y);
  }
  const [first, last] = [inked[Math.floor(inked.length * 0.1)], inked[Math.floor(inked.length * 0.9)]];
  return first === undefined || last === undefined || last - first < height * 0.2 ? null : { start: first, end: last };
}

/** Row by row, as the pixels lie: down each column in turn takes three times as long. */
function clearColumns(width: number, ink: Uint8Array, { start, end }: Band): boolean[] {
  const dark = new Uint32Array(width);
  for (let y = start; y < end; y += 1) {
    for (let x = 0, at = y * width; x < width; x += 1, at += 1) dark[x] = (dark[x] ?? 0) + (ink[at] ?? 0);
  }
  return Array.from(dark, (count) => count <= (end - start) * (1 - clearShare));
}

function bandsOf(clear: boolean[], narrowest: number): Band[] {
  const bands: Band[] = [];
  let start = -1;
  clear.forEach((isClear, x) => {
    if (isClear && start < 0) start = x;
    if (!isClear && start >= 0) {
      if (x - start >= narrowest) bands.push({ start, end: x });
      start = -1;
    }
  });
  return bands;
}
