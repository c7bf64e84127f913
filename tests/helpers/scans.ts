import { createRequire } from 'node:module';
import path from 'node:path';
import { GlobalFonts, createCanvas } from '@napi-rs/canvas';
import { PDFDocument } from 'pdf-lib';

const require = createRequire(import.meta.url);
const faceFile = path.join(
  path.dirname(require.resolve('@fontsource/courier-prime/package.json')),
  'files/courier-prime-latin-400-normal.woff2',
);
GlobalFonts.registerFromPath(faceFile, 'Test Typewriter');

const dpi = 150;

/** A typewritten sheet as a grey picture of 150 dots an inch: letter size, one line of text a line. */
export function drawSheet(lines: readonly string[], type: 'image/jpeg' | 'image/png' = 'image/jpeg'): Buffer {
  const canvas = createCanvas(8.5 * dpi, 11 * dpi);
  const pen = canvas.getContext('2d');
  pen.fillStyle = '#f4f1e8';
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.fillStyle = '#222';
  pen.font = '25px "Test Typewriter"';
  lines.forEach((line, at) => pen.fillText(line, 1 * dpi, 1.6 * dpi + at * 42));
  return type === 'image/png' ? canvas.toBuffer('image/png') : canvas.toBuffer('image/jpeg', 85);
}

/** An image-only PDF, one sheet a page. */
export async function scanOf(pages: readonly (readonly string[])[]): Promise<Uint8Array> {
  const pdf = await PDFDocument.create();
  for (const lines of pages) {
    const picture = await pdf.embedJpg(drawSheet(lines));
    pdf.addPage([612, 792]).drawImage(picture, { x: 0, y: 0, width: 612, height: 792 });
  }
  return pdf.save();
}

export const sheet = (number: number): string[] => [
  `SECTION ${number}. ALIGNMENT`,
  '',
  `a. Connect the meter to test point TP${number}.`,
  'b. Tune the core of coil L5 for the greatest reading.',
  `c. The injection must be 145.900 mc on sheet ${number}.`,
];
