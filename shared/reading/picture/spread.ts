import type { GreyPicture } from './grey.ts';

/** Two upright pages side by side are wider than high; one landscape sheet is too, so the gutter decides. */
const leastAspect = 1.15;
/** The gutter lies near the middle, as shares of the width, and is two inner margins wide. */
const gutterWithin = [0.4, 0.6] as const;
const leastGutterInches = 0.55;
/** The gaps between the columns of a table on a landscape sheet are all of a kind; a gutter is wider than any of them. */
const widerThanOthers = 1.5;
/** Rims of sheets and the shadow of the fold are left out at top and bottom. */
const rimShare = 0.06;
const darkBelow = 140;
/** A column of the gutter may hold this share of dark pixels: specks, not letters. Or it is the fold's shadow, dark throughout. */
const mostInk = 0.004;
const foldInk = 0.5;
/** Each page has print in at least this share of its columns. */
const leastPrinted = 0.35;

/**
 * Where two pages meet in a picture of a double-page spread, as a share of its width; null where it is no spread. The
 * picture is upright, straight and small: about 100 dots an inch, as `dpi` says.
 */
export function gutterOf(picture: GreyPicture, dpi: number): number | null {
  const { width, height } = picture;
  if (width < height * leastAspect) return null;
  const blank = blankColumns(picture);
  const gaps = runsOf(blank);
  const isMiddle = ({ middle }: Gap): boolean => middle > gutterWithin[0] * width && middle < gutterWithin[1] * width;
  const [gutter] = gaps.filter(isMiddle).sort((a, b) => b.length - a.length);
  if (gutter === undefined || gutter.length < leastGutterInches * dpi) return null;
  if (gaps.some((gap) => gap !== gutter && !isRim(gap, width) && gap.length * widerThanOthers > gutter.length))
    return null;
  const { middle } = gutter;
  const isPrinted = (left: number, right: number): boolean => {
    let printed = 0;
    for (let x = Math.ceil(left); x < right; x += 1) printed += 1 - (blank[x] ?? 1);
    return printed >= (right - left) * leastPrinted;
  };
  return isPrinted(0, middle) && isPrinted(middle, width) ? middle / width : null;
}

type Gap = { start: number; length: number; middle: number };

const isRim = ({ start, length }: Gap, width: number): boolean => start === 0 || start + length === width;

/** The runs of blank columns. */
function runsOf(blank: Uint8Array): Gap[] {
  const gaps: Gap[] = [];
  for (let x = 0; x < blank.length; x += 1) {
    const start = x;
    while (blank[x] === 1) x += 1;
    if (x > start) gaps.push({ start, length: x - start, middle: (start + x) / 2 });
  }
  return gaps;
}

/** 1 for each column of pixels that holds no print. */
function blankColumns({ width, height, data }: GreyPicture): Uint8Array {
  const [top, bottom] = [Math.round(height * rimShare), Math.round(height * (1 - rimShare))];
  const blank = new Uint8Array(width);
  for (let x = 0; x < width; x += 1) {
    let ink = 0;
    for (let y = top; y < bottom; y += 1) if ((data[y * width + x] ?? 255) < darkBelow) ink += 1;
    const share = ink / (bottom - top);
    blank[x] = share <= mostInk || share >= foldInk ? 1 : 0;
  }
  return blank;
}
