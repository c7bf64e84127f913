import { open } from 'node:fs/promises';
import { fileTypeFromFile } from 'file-type';
import sharp from 'sharp';
import { openPdf, pdfProblem } from './pdf.ts';

export type InspectInput = { path: string; mostPages: number; mostMegapixels: number };
export type Inspected =
  { mediaType: string; pageCount: number } | { refused: string; code: 'wrong-kind' | 'too-large' | 'cannot-do' };

const pictures = new Set(['image/tiff', 'image/png', 'image/jpeg', 'image/webp']);
/** Some writers put a few bytes ahead of a PDF's header; readers look this far for it. */
const pdfHeaderWithinBytes = 1024;

/** Tells what a file is by its bytes, whatever its name, and whether it can be taken in. Runs in a worker process. */
export async function inspect({ path, mostPages, mostMegapixels }: InspectInput): Promise<Inspected> {
  const mediaType = await kindOf(path);
  if (mediaType === 'application/pdf') return inspectPdf(path, mostPages);
  if (mediaType !== undefined && pictures.has(mediaType))
    return inspectPicture({ path, mostPages, mostMegapixels }, mediaType);
  const seen = mediaType === undefined ? '' : ` (it looks like ${mediaType})`;
  return { refused: `This is not a PDF, TIFF, PNG, JPEG or WebP file${seen}.`, code: 'wrong-kind' };
}

async function kindOf(path: string): Promise<string | undefined> {
  const file = await open(path);
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(pdfHeaderWithinBytes), 0, pdfHeaderWithinBytes, 0);
    if (buffer.subarray(0, bytesRead).includes('%PDF-')) return 'application/pdf';
  } finally {
    await file.close();
  }
  return (await fileTypeFromFile(path).catch(() => undefined))?.mime;
}

async function inspectPdf(path: string, mostPages: number): Promise<Inspected> {
  try {
    const pdf = await openPdf(path);
    const pageCount = pdf.numPages;
    if (pageCount > mostPages) return tooManyPages(pageCount, mostPages);
    if (pageCount < 1) return { refused: 'This PDF has no pages.', code: 'cannot-do' };
    // A broken page tree shows only when a page is asked for.
    await pdf.getPage(1);
    await pdf.loadingTask.destroy();
    return { mediaType: 'application/pdf', pageCount };
  } catch (error) {
    return { refused: pdfProblem(error), code: 'cannot-do' };
  }
}

async function inspectPicture(
  { path, mostPages, mostMegapixels }: InspectInput,
  mediaType: string,
): Promise<Inspected> {
  try {
    const { width, height, pages = 1 } = await sharp(path, { limitInputPixels: false }).metadata();
    const megapixels = (width * height) / 1e6;
    if (mediaType === 'image/webp' && pages > 1)
      return { refused: 'This is a moving picture, not a scan.', code: 'wrong-kind' };
    if (pages > mostPages) return tooManyPages(pages, mostPages);
    if (megapixels > mostMegapixels || Math.max(width, height) > 30_000) {
      const size = `${width} by ${height} pixels`;
      return {
        refused: `This picture of ${size} is larger than the ${mostMegapixels} megapixels that are read.`,
        code: 'too-large',
      };
    }
    await sharp(path, { limitInputPixels: mostMegapixels * 1e6, sequentialRead: true })
      .resize(64)
      .toBuffer();
    return { mediaType, pageCount: pages };
  } catch {
    return { refused: 'This picture is damaged or cut short: it cannot be decoded.', code: 'cannot-do' };
  }
}

const tooManyPages = (pages: number, most: number): Inspected => ({
  refused: `This file has ${pages} pages; up to ${most} are taken in one file. Split it and upload the parts.`,
  code: 'too-large',
});
