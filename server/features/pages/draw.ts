import { writeFile } from 'node:fs/promises';
import { OPS, type PDFDocumentProxy, type PDFPageProxy } from 'pdfjs-dist/legacy/build/pdf.mjs';
import sharp, { type OutputInfo, type Sharp } from 'sharp';
import type { Zone } from '#shared/document/define-block.ts';
import { flatten } from '#shared/reading/picture/flatten.ts';
import { dpiByType } from '#shared/reading/picture/type-size.ts';
import type { TextLayer } from '#shared/reading/text-layer.ts';
import { openPdf, pdfProblem } from './pdf.ts';
import { textLayerOf } from './text-layer.ts';

/** Half of a spread that was divided at this share of its width. */
export type Part = { half: 'left' | 'right'; cutShare: number };
export type DrawInput = {
  path: string;
  mediaType: string;
  sourcePage: number;
  part: Part | null;
  target: string;
  /** Where the words that the source carries for the page go, as JSON. */
  layerTarget: string;
  mostMegapixels: number;
};
export type Drawn = { width: number; height: number; dpi: number; hasLayer: boolean };

/** A page that will fail the same way however often it is tried. */
export class HopelessPage extends Error {
  override name = 'HopelessPage';
}

const pointsPerInch = 72;
const pdfDpi = 300;
/** A PDF page larger than this is drawn at fewer dots an inch. */
const mostDrawnPixels = 40e6;
const jpegQuality = 90;
/** Mean difference between colour channels, of 255, above which a scan is worth keeping in colour. */
const colourWorthKeeping = 6;

/** Draws one page of a source to a JPEG file. Runs in a worker process. */
export async function drawPage(input: DrawInput): Promise<Drawn> {
  return input.mediaType === 'application/pdf' ? drawPdfPage(input) : drawPicture(input);
}

async function drawPicture({ path, sourcePage, part, target, mostMegapixels }: DrawInput): Promise<Drawn> {
  const options = { page: sourcePage, limitInputPixels: mostMegapixels * 1e6, failOn: 'error' } as const;
  try {
    const { density } = await sharp(path, options).metadata();
    const upright = sharp(path, options).autoOrient().flatten({ background: 'white' }).toColourspace('srgb');
    const { width, height } = await writePicture(upright, part, target);
    return { width, height, dpi: statedDpi(density, height) ?? (await dpiOf(target, height)), hasLayer: false };
  } catch (error) {
    throw new HopelessPage(
      `This picture cannot be decoded: ${error instanceof Error ? firstLine(error.message) : 'unknown fault'}.`,
    );
  }
}

const firstLine = (text: string): string => (text.split('\n')[0] ?? '').slice(0, 120);

/** The density that a picture states; null where it states none, or one that was never true. */
function statedDpi(density: number | undefined, height: number): number | null {
  if (density === undefined || density < 100 || density > 1200) return null;
  const inches = height / density;
  return inches > 2 && inches < 40 ? density : null;
}

/** A sheet that does not tell its resolution is taken to be about 11 inches high, or less where its type says so. */
async function dpiOf(drawn: string, height: number): Promise<number> {
  const usualSheetInches = 11;
  const guess = Math.min(600, Math.max(75, Math.round(height / usualSheetInches)));
  const { data, info } = await sharp(drawn)
    .greyscale()
    .toColourspace('b-w')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const even = flatten({ width: info.width, height: info.height, data: new Uint8Array(data) });
  return Math.min(600, dpiByType(even, guess));
}

let opened: { path: string; pdf: PDFDocumentProxy } | null = null;

/** Pages of one source usually follow each other, so the document stays open between them. */
async function documentOf(path: string): Promise<PDFDocumentProxy> {
  if (opened?.path === path) return opened.pdf;
  await opened?.pdf.loadingTask.destroy();
  opened = null;
  const pdf = await openPdf(path);
  opened = { path, pdf };
  return pdf;
}

async function drawPdfPage({ path, sourcePage, part, target, layerTarget }: DrawInput): Promise<Drawn> {
  const { pdf, page } = await pageOf(path, sourcePage);
  try {
    const base = page.getViewport({ scale: 1 });
    const scale = Math.min(pdfDpi / pointsPerInch, Math.sqrt(mostDrawnPixels / (base.width * base.height)));
    const viewport = page.getViewport({ scale });
    const size = { width: Math.max(1, Math.round(viewport.width)), height: Math.max(1, Math.round(viewport.height)) };
    const { canvas } = (pdf.canvasFactory as CanvasFactory).create(size.width, size.height);
    await page.render({ canvas: canvas as never, viewport, background: 'white' }).promise;
    const raw = sharp(canvas.data(), { raw: { ...size, channels: 4 } }).removeAlpha();
    const { width, height, deviation } = await writePicture(raw, part, target);
    canvas.width = 0;
    if (deviation < 0.5 && (await holdsPictures(page))) {
      throw new HopelessPage('The picture on this page is damaged or far too large: it came out blank.');
    }
    const layer = partOfLayer(await textLayerOf(page, viewport), part, size.width);
    if (layer !== null) await writeFile(layerTarget, JSON.stringify(layer));
    return { width, height, dpi: Math.round(scale * pointsPerInch), hasLayer: layer !== null };
  } finally {
    page.cleanup();
  }
}

type CanvasFactory = { create: (width: number, height: number) => { canvas: { width: number; data: () => Buffer } } };

async function pageOf(path: string, sourcePage: number): Promise<{ pdf: PDFDocumentProxy; page: PDFPageProxy }> {
  try {
    const pdf = await documentOf(path);
    return { pdf, page: await pdf.getPage(sourcePage + 1) };
  } catch (error) {
    throw new HopelessPage(pdfProblem(error));
  }
}

const pictureOperators = new Set<number>([
  OPS.paintImageXObject,
  OPS.paintInlineImageXObject,
  OPS.paintImageMaskXObject,
]);

/** Operators that set the scene and draw nothing: what is left of a page whose only picture was too large to decode. */
const bareOperators = new Set<number>([
  OPS.save,
  OPS.restore,
  OPS.transform,
  OPS.dependency,
  OPS.beginGroup,
  OPS.endGroup,
]);

/** Whether a page that came out blank should not have: it paints a picture, or sets out to and then does not. */
async function holdsPictures(page: PDFPageProxy): Promise<boolean> {
  const { fnArray } = await page.getOperatorList();
  const isHollow = fnArray.length > 0 && fnArray.every((operator) => bareOperators.has(operator));
  return isHollow || fnArray.some((operator) => pictureOperators.has(operator));
}

/** Writes the picture as JPEG, grey unless its colours carry something; tells its size and how much it varies. */
async function writePicture(
  picture: Sharp,
  part: Part | null,
  target: string,
): Promise<{ width: number; height: number; deviation: number }> {
  const { data, info } = await partOf(await picture.raw().toBuffer({ resolveWithObject: true }), part);
  const raw = { width: info.width, height: info.height, channels: info.channels };
  const small = await sharp(data, { raw })
    .resize(200, 200, { fit: 'fill' })
    .toColourspace('srgb')
    .removeAlpha()
    .raw()
    .toBuffer();
  const { deviation, chroma } = variationOf(small);
  const out = sharp(data, { raw });
  const inked = chroma > colourWorthKeeping ? out : out.greyscale().toColourspace('b-w');
  await inked.jpeg({ quality: jpegQuality, chromaSubsampling: '4:4:4' }).toFile(target);
  return { width: info.width, height: info.height, deviation };
}

type Raw = { data: Buffer; info: OutputInfo };

async function partOf({ data, info }: Raw, part: Part | null): Promise<Raw> {
  if (part === null) return { data, info };
  const { left, width } = spanOf(part, info.width);
  return sharp(data, { raw: { width: info.width, height: info.height, channels: info.channels } })
    .extract({ left, top: 0, width, height: info.height })
    .raw()
    .toBuffer({ resolveWithObject: true });
}

/** Columns of pixels that a half takes of the whole picture's. */
function spanOf({ half, cutShare }: Part, width: number): { left: number; width: number } {
  const cut = Math.min(width - 1, Math.max(1, Math.round(width * cutShare)));
  return half === 'left' ? { left: 0, width: cut } : { left: cut, width: width - cut };
}

function partOfLayer(layer: TextLayer | null, part: Part | null, width: number): TextLayer | null {
  if (layer === null || part === null) return layer;
  const span = spanOf(part, width);
  const words = layer.words
    .map(({ text, box: [x, y, w, h] }) => ({ text, box: [x - span.left, y, w, h] as Zone }))
    .filter(({ box: [x, , w] }) => x + w / 2 >= 0 && x + w / 2 < span.width);
  return { ...layer, words };
}

/** Standard deviation of lightness and mean distance between the colour channels, both of 255, of packed RGB pixels. */
export function variationOf(rgb: Uint8Array): { deviation: number; chroma: number } {
  let [sum, squares, distance] = [0, 0, 0];
  const pixels = Math.floor(rgb.length / 3);
  for (let at = 0; at < pixels * 3; at += 3) {
    const [red, green, blue] = [rgb[at] ?? 0, rgb[at + 1] ?? 0, rgb[at + 2] ?? 0];
    const light = (red + green + blue) / 3;
    sum += light;
    squares += light * light;
    distance += Math.max(red, green, blue) - Math.min(red, green, blue);
  }
  const mean = sum / pixels;
  return { deviation: Math.sqrt(Math.max(0, squares / pixels - mean * mean)), chroma: distance / pixels };
}
