import sharp, { type Sharp } from 'sharp';
import { flatten } from '#shared/reading/picture/flatten.ts';
import { type GreyPicture, shrink } from '#shared/reading/picture/grey.ts';
import { hasTwoColumns } from '#shared/reading/picture/layout.ts';
import { removeRules } from '#shared/reading/picture/rules.ts';
import { skewDegrees } from '#shared/reading/picture/skew.ts';
import type { RecipeWish, Transform } from '#shared/reading/reading.ts';
import type { Segmentation } from './engine.ts';

/** Reading works best near this resolution; finer scans are brought down to it, coarser ones up, for reading only. */
const readingDpi = 300;
const finestDpi = 400;
const coarsestDpi = 250;
const analysisDpi = 100;
/** A page that leans less than this is left as it is: turning it would only soften it. */
const leastSkewDegrees = 0.08;
const jpegQuality = 90;

export type Prepared = {
  /** The picture as read, encoded for people; the same size as `transform` speaks of. */
  shown: { width: number; height: number; dpi: number };
  transform: Transform;
  skew: number;
  /** Encoded for the engine, at `scale` times the size of the picture as read. */
  picture: Buffer;
  scale: number;
  segmentation: Segmentation;
  rulesRemoved: boolean;
  flattened: boolean;
  /** About 100 dots an inch, with its rules in place, for finding drawings; `coarseScale` takes it to the picture as read. */
  coarse: GreyPicture;
  coarseScale: number;
};

/** Straightens the drawn picture, writes it as the page image, and makes the picture that the engine is given. */
export async function prepare(
  drawn: string,
  dpi: number,
  { target, wish }: { target: string; wish: RecipeWish },
): Promise<Prepared> {
  const { width, height } = await sharp(drawn).metadata();
  const size = dpi > finestDpi ? readingDpi / dpi : 1;
  const shrunk = { width: Math.round(width * size), height: Math.round(height * size) };
  const skew = wish.skewDegrees ?? (await measureSkew(drawn, dpi));
  const lean = Math.abs(skew) < leastSkewDegrees ? 0 : skew;
  const straight = sharp(drawn)
    .resize(shrunk.width, shrunk.height, { fit: 'fill' })
    .rotate(-lean, { background: 'white' });
  const { data, info } = await straight.raw().toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  await sharp(data, { raw }).jpeg({ quality: jpegQuality, chromaSubsampling: '4:4:4' }).toFile(target);
  const shown = { width: info.width, height: info.height, dpi: dpi * size };
  const grey = await greyAtReadingSize(sharp(data, { raw }), shown);
  return { shown, skew: lean, transform: backToDrawn(shrunk, shown, { lean, size }), ...(await forEngine(grey, wish)) };
}

async function measureSkew(drawn: string, dpi: number): Promise<number> {
  const { width } = await sharp(drawn).metadata();
  const small = await greyOf(sharp(drawn).resize(Math.max(64, Math.round((width * analysisDpi) / dpi))));
  return skewDegrees(flatten(small));
}

async function greyOf(picture: Sharp): Promise<GreyPicture> {
  const { data, info } = await picture.greyscale().toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
  return {
    width: info.width,
    height: info.height,
    data: new Uint8Array(data.buffer, data.byteOffset, data.byteLength),
  };
}

async function greyAtReadingSize(
  picture: Sharp,
  { width, dpi }: Prepared['shown'],
): Promise<GreyPicture & { scale: number; dpi: number }> {
  const scale = dpi < coarsestDpi ? readingDpi / dpi : 1;
  const grey = await greyOf(
    scale === 1 ? picture : picture.resize({ width: Math.round(width * scale), kernel: 'cubic' }),
  );
  return { ...grey, scale, dpi: Math.round(dpi * scale) };
}

type EnginePart = Omit<Prepared, 'shown' | 'transform' | 'skew'>;

async function forEngine(
  { scale, dpi, ...grey }: GreyPicture & { scale: number; dpi: number },
  wish: RecipeWish,
): Promise<EnginePart> {
  const flattened = wish.flattened ?? true;
  const rulesRemoved = wish.rulesRemoved ?? true;
  const flat = flattened ? flatten(grey) : grey;
  const clean = rulesRemoved ? removeRules(flat, dpi).picture : flat;
  const factor = Math.max(1, Math.round(dpi / analysisDpi));
  const segmentation =
    wish.segmentation ?? (hasTwoColumns(shrink(clean, factor), dpi / factor) ? 'columns' : 'one-column');
  const picture = await sharp(clean.data, { raw: { width: clean.width, height: clean.height, channels: 1 } })
    .toColourspace('b-w')
    .png({ compressionLevel: 1 })
    .toBuffer();
  return {
    picture,
    scale,
    segmentation,
    rulesRemoved,
    flattened,
    coarse: shrink(flat, factor),
    coarseScale: factor / scale,
  };
}

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
