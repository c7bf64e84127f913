import sharp, { type OutputInfo, type Sharp } from 'sharp';
import { flatten } from '#shared/reading/picture/flatten.ts';
import { type GreyPicture, shrink } from '#shared/reading/picture/grey.ts';
import { hasTwoColumns } from '#shared/reading/picture/layout.ts';
import { removeLeaders } from '#shared/reading/picture/leaders.ts';
import { medianFiltered } from '#shared/reading/picture/median.ts';
import { removePatches } from '#shared/reading/picture/patches.ts';
import { type PictureQuality, pictureQuality } from '#shared/reading/picture/quality.ts';
import { removeRules } from '#shared/reading/picture/rules.ts';
import { skewDegrees } from '#shared/reading/picture/skew.ts';
import { drawnAnew } from '#shared/reading/picture/straighten.ts';
import { type Turn, backFrom, composed, isQuarter } from '#shared/reading/picture/turn.ts';
import type { RecipeWish, Transform } from '#shared/reading/reading.ts';
import type { Segmentation } from './engine.ts';

/** Reading works best near this resolution; finer scans are brought down to it, coarser ones up, for reading only. */
export const readingDpi = 300;
const finestDpi = 400;
export const coarsestDpi = 250;
const analysisDpi = 100;
/** A page that leans less than this is left as it is: turning it would only soften it. */
const leastSkewDegrees = 0.08;
/** Best codes for each picture would save 3 % of its size for eight times the time. */
const jpegQuality = 90;

export type Prepared = {
  /** The picture as read, encoded for people; the same size as `transform` speaks of. */
  shown: { width: number; height: number; dpi: number };
  transform: Transform;
  skew: number;
  quality: PictureQuality;
  /** Encoded for the engine, at `scale` times the size of the picture as read. */
  picture: Buffer;
  /** The same, not encoded: cells that are read once more are cut from it. */
  clean: GreyPicture;
  /** The same with its rules and leaders in place: the lines of a drawing hold its lettering apart. */
  lined: GreyPicture;
  scale: number;
  segmentation: Segmentation;
  rulesRemoved: boolean;
  flattened: boolean;
  /** About 100 dots an inch, with its rules in place, for finding drawings; `coarseScale` takes it to the picture as read. */
  coarse: GreyPicture;
  /** The same without its rules. */
  coarseClean: GreyPicture;
  coarseScale: number;
};

/** Straightens the drawn picture, writes it as the page image, and makes the picture that the engine is given. */
export async function prepare(
  drawn: string,
  dpi: number,
  { target, wish }: { target: string; wish: RecipeWish },
): Promise<Prepared> {
  const turn = wish.turnDegrees ?? 0;
  const { width, height } = turnedSize(await sharp(drawn).metadata(), turn);
  const size = dpi > finestDpi ? readingDpi / dpi : 1;
  const shrunk = { width: Math.round(width * size), height: Math.round(height * size) };
  const upright = sharp(drawn).rotate(turn);
  if (size !== 1) upright.resize(shrunk.width, shrunk.height, { fit: 'fill' });
  const raw = await upright.raw().toBuffer({ resolveWithObject: true });
  const grey = await greyOf(raw);
  const even = (wish.flattened ?? true) ? removePatches(flatten(grey), dpi * size) : grey;
  const quality = pictureQuality(grey, even, dpi * size);
  const skew = wish.skewDegrees ?? skewDegrees(shrink(even, Math.max(1, Math.round((dpi * size) / analysisDpi))));
  const lean = Math.abs(skew) < leastSkewDegrees ? 0 : skew;
  const shown = { ...(await written(raw, lean, target)), dpi: dpi * size };
  // Made even before it is turned: the white corners that turning adds would otherwise pull the paper beside them down.
  // The image library turns it: mixing four pixels, as for people, loses the thin strokes of fractions and of Ω.
  const straight =
    lean === 0
      ? even
      : await greyOf(
          await sharpOf(even).rotate(-lean, { background: 'white' }).raw().toBuffer({ resolveWithObject: true }),
        );
  const engine = forEngine(await atReadingSize(straight, shown.dpi), wish);
  const leant = backToDrawn(shrunk, shown, { lean, size });
  const transform = composed(leant, backFrom(turn, turnedSize({ width, height }, turn)));
  return { shown, skew: lean, transform, quality, ...engine };
}

const sharpOf = ({ width, height, data }: GreyPicture): Sharp =>
  sharp(data, { raw: { width, height, channels: 1 } }).toColourspace('b-w');

type Raw = { data: Buffer; info: OutputInfo };

const opened = ({ data, info: { width, height, channels } }: Raw): Sharp =>
  sharp(data, { raw: { width, height, channels } });

/** Writes the page image for people, straightened. */
async function written(raw: Raw, lean: number, target: string): Promise<Size> {
  const { width, height } = await straightened(raw, lean)
    .jpeg({ quality: jpegQuality, chromaSubsampling: '4:4:4', optimiseCoding: false })
    .toFile(target);
  return { width, height };
}

function straightened(raw: Raw, lean: number): Sharp {
  if (lean === 0) return opened(raw);
  const { data, info } = raw;
  if (info.channels !== 1) return opened(raw).rotate(-lean, { background: 'white' });
  const size = turnedBy(info, lean);
  return sharpOf(drawnAnew({ ...info, data }, size, backToDrawn(info, size, { lean, size: 1 })));
}

/** The size of a sheet that holds another one turned by some degrees. */
function turnedBy({ width, height }: Size, degrees: number): Size {
  const [cos, sin] = [Math.cos, Math.sin].map((of) => Math.abs(of((degrees * Math.PI) / 180))) as [number, number];
  return { width: Math.round(width * cos + height * sin), height: Math.round(width * sin + height * cos) };
}

async function greyOf(raw: Raw): Promise<GreyPicture> {
  const one =
    raw.info.channels === 1
      ? raw
      : await opened(raw).greyscale().toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
  const { data, info } = one;
  return {
    width: info.width,
    height: info.height,
    data: new Uint8Array(data.buffer, data.byteOffset, data.byteLength),
  };
}

type Sized = GreyPicture & { scale: number; dpi: number };

/**
 * Reading at 250 dots an inch instead of 300 was tried: it saved nothing that could be measured, and cost a little.
 *
 * Fine scans lose their specks to a median filter; in coarse ones it would take thin strokes too, so they are only enlarged. */
async function atReadingSize(picture: GreyPicture, dpi: number): Promise<Sized> {
  if (dpi >= coarsestDpi) return { ...medianFiltered(picture), scale: 1, dpi: Math.round(dpi) };
  const scale = readingDpi / dpi;
  const width = Math.round(picture.width * scale);
  const enlarged = sharpOf(picture).resize({ width, kernel: 'cubic' }).raw();
  return { ...(await greyOf(await enlarged.toBuffer({ resolveWithObject: true }))), scale, dpi: readingDpi };
}

/** As a portable grey map, the least work for both sides: nothing is compressed only to be unpacked again. */
export const encoded = ({ width, height, data }: GreyPicture): Buffer =>
  Buffer.concat([Buffer.from(`P5\n${width} ${height}\n255\n`, 'latin1'), data]);

type EnginePart = Omit<Prepared, 'shown' | 'transform' | 'skew' | 'quality'>;

function forEngine({ scale, dpi, ...flat }: Sized, wish: RecipeWish): EnginePart {
  const rulesRemoved = wish.rulesRemoved ?? true;
  const ruleless = rulesRemoved ? removeRules(flat, dpi).picture : flat;
  const clean = removeLeaders(ruleless, dpi).picture;
  const factor = Math.max(1, Math.round(dpi / analysisDpi));
  const coarseClean = shrink(clean, factor);
  const segmentation = wish.segmentation ?? (hasTwoColumns(coarseClean, dpi / factor) ? 'columns' : 'one-column');
  return {
    picture: encoded(clean),
    clean,
    lined: flat,
    scale,
    segmentation,
    rulesRemoved,
    flattened: wish.flattened ?? true,
    coarse: shrink(flat, factor),
    coarseClean,
    coarseScale: factor / scale,
  };
}

/** Turning twice gives the size back, so it serves both ways. */
const turnedSize = ({ width, height }: Size, turn: Turn): Size =>
  isQuarter(turn) ? { width: height, height: width } : { width, height };

type Size = { width: number; height: number };

/** Undoes the straightening (about the middle) and the shrinking: a point of the picture as read to one of the picture as drawn. */
export function backToDrawn(before: Size, after: Size, { lean, size }: { lean: number; size: number }): Transform {
  const angle = (lean * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const [cx, cy] = [before.width / 2, before.height / 2];
  const [rx, ry] = [after.width / 2, after.height / 2];
  const row = (a: number, b: number, c: number): [number, number, number] => [a / size, b / size, c / size];
  return [row(cos, -sin, cx - cos * rx + sin * ry), row(sin, cos, cy - sin * rx - cos * ry)];
}
