import type { Zone } from '#shared/document/define-block.ts';
import { type Component, eachComponent } from '#shared/reading/picture/components.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { oddsOnItsOwn } from './classify.ts';

/** Levels that part ink from paper, the usual one first: figures that touch the stroke come apart at a darker one. */
const inkLevels = [128, 90, 60];
/** A fraction's stroke, in shares of the whole: nearly as high, some way across, and thin, so that it fills little of its box. */
const leastStrokeHeight = 0.75;
const leastStrokeWidth = 0.3;
const mostStrokeFill = 0.42;
/** Its figures are so high, in shares of the whole. */
const leastFigure = 0.25;
const mostFigure = 0.7;
/** A whole number before the stroke reaches further down than the figures above it. */
const wholeFoot = 0.65;
const denominators = new Set([2, 3, 4, 5, 6, 8, 16, 32, 64]);
const asSigns: Record<string, string> = {
  '1/2': '½',
  '1/4': '¼',
  '3/4': '¾',
  '1/8': '⅛',
  '3/8': '⅜',
  '5/8': '⅝',
  '7/8': '⅞',
  '1/3': '⅓',
  '2/3': '⅔',
};

/**
 * The fraction whose ink fills a zone: a slanting stroke with figures above it on the left and below it on the right.
 * `read` is what the engine made of it, `isTall` that it stands out from its line. Null where there is no such stroke, or where the figures make no fraction that is printed.
 */
export function fractionIn(
  picture: GreyPicture,
  zone: Zone,
  { read, isTall }: { read: string; isTall: boolean },
): string | null {
  for (const level of isTall ? inkLevels : inkLevels.slice(0, 1)) {
    const found = fractionOf(componentsIn(picture, zone, level), picture, read);
    if (found !== null) return found;
  }
  return null;
}

function fractionOf(pieces: readonly Stroke[], picture: GreyPicture, read: string): string | null {
  const [left, top] = [Math.min(...pieces.map(({ x }) => x)), Math.min(...pieces.map(({ y }) => y))];
  const height = Math.max(...pieces.map((piece) => piece.y + piece.height)) - top;
  const width = Math.max(...pieces.map((piece) => piece.x + piece.width)) - left;
  const stroke = pieces.find((piece) => isStroke(piece, { width, height }));
  if (stroke === undefined) return null;
  const figures = pieces.filter(
    (piece) => piece !== stroke && piece.height >= height * leastFigure && piece.height <= height * mostFigure,
  );
  const isWhole = (piece: Component): boolean =>
    piece.x + piece.width <= stroke.x + stroke.width / 2 && piece.y + piece.height - top > height * wholeFoot;
  const isAbove = ({ x, y, width: w, height: h }: Component): boolean =>
    (x + w / 2 - stroke.x) / stroke.width + (y + h / 2 - stroke.y) / stroke.height < 1;
  const parts = figures.filter((piece) => !isWhole(piece));
  const sides = [figures.filter(isWhole), parts.filter(isAbove), parts.filter((each) => !isAbove(each))];
  const [whole = '', above, below] = sides.map((own) =>
    [...own]
      .sort((a, b) => a.x - b.x)
      .map((each) => figureIn(picture, each, read))
      .join(''),
  );
  const fraction = written(Number(above), Number(below));
  return fraction === null ? null : whole + (whole !== '' && fraction.includes('/') ? ' ' : '') + fraction;
}

function written(above: number, below: number): string | null {
  if (!(above > 0) || !denominators.has(below) || above >= below) return null;
  return asSigns[`${above}/${below}`] ?? `${above}/${below}`;
}

/** What else a figure may look like; the 1 of old faces is a small capital I. */
const figureLooks = ['1Ili', '2Zz', '3', '4', '5Ss', '6', '7', '8B', '9'];
/** What the engine read is so many times as likely as what it did not. */
const readCounts = 4;

/** The likeliest figure, by its picture and by what the engine made of the whole. */
function figureIn(picture: GreyPicture, { x, y, width, height }: Component, read: string): string {
  const odds = oddsOnItsOwn(picture, [x, y, width, height]);
  const of = (looks: string): number =>
    [...looks].reduce((sum, glyph) => sum + odds(glyph), 0) * (read.includes(looks.charAt(0)) ? readCounts : 1);
  return [...figureLooks].sort((a, b) => of(b) - of(a))[0]?.charAt(0) ?? '?';
}

type Stroke = Component & { isSlanting: boolean };

const isStroke = (piece: Stroke, { width, height }: { width: number; height: number }): boolean =>
  piece.isSlanting &&
  piece.height >= height * leastStrokeHeight &&
  piece.width >= Math.min(width, height) * leastStrokeWidth &&
  piece.area <= piece.width * piece.height * mostStrokeFill;

/** The pieces of ink in a zone, in the picture's pixels; one slants when its ink keeps near the line from lower left to upper right. */
function componentsIn(picture: GreyPicture, [x, y, w, h]: Zone, level: number): Stroke[] {
  const ink = new Uint8Array(w * h);
  for (let row = 0; row < h; row += 1)
    for (let column = 0; column < w; column += 1)
      if ((picture.data[(y + row) * picture.width + x + column] ?? 255) < level) ink[row * w + column] = 1;
  const found: Stroke[] = [];
  eachComponent({ width: w, height: h, ink }, (piece, pixels) => {
    if (piece.area < 6) return;
    const near = pixels.filter((pixel) => {
      const [px, py] = [pixel % w, Math.floor(pixel / w)];
      return Math.abs((px - piece.x) / piece.width + (py - piece.y) / piece.height - 1) < nearDiagonal;
    });
    const isSlanting = near.length >= pixels.length * mostlyDiagonal;
    found.push({ ...piece, x: piece.x + x, y: piece.y + y, isSlanting });
  });
  return found;
}

const nearDiagonal = 0.3;
const mostlyDiagonal = 0.9;
