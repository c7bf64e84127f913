import { createRequire } from 'node:module';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { type PDFDocumentProxy, VerbosityLevel, getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

const root = path.dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'));
/** Pictures larger than this inside a PDF are left out by the library rather than decoded to gigabytes. */
const mostPixelsOfOnePicture = 120e6;

/** Opens a PDF by its path; only the parts that are needed are read. */
export const openPdf = (file: string): Promise<PDFDocumentProxy> =>
  getDocument({
    url: pathToFileURL(file).href,
    wasmUrl: `${root}/wasm/`,
    cMapUrl: `${root}/cmaps/`,
    standardFontDataUrl: `${root}/standard_fonts/`,
    iccUrl: `${root}/iccs/`,
    maxImageSize: mostPixelsOfOnePicture,
    isEvalSupported: false,
    disableAutoFetch: true,
    verbosity: VerbosityLevel.ERRORS,
  }).promise;

/** The library's failures in words that say what to do. */
export function pdfProblem(error: unknown): string {
  const name = error instanceof Error ? error.name : '';
  if (name === 'PasswordException')
    return 'This PDF is encrypted and asks for a password. Save a copy without one and upload that.';
  return 'This PDF is damaged or cut short: its pages cannot be found.';
}
