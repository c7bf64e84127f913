import { createRequire } from 'node:module';
import path from 'node:path';
import { GlobalFonts, createCanvas } from '@napi-rs/canvas';
import sharp from 'sharp';

const require = createRequire(import.meta.url);
const shipped = (name: string, file: string): string =>
  path.join(path.dirname(require.resolve(`${name}/package.json`)), 'files', file);
GlobalFonts.registerFromPath(
  shipped('@fontsource/source-serif-4', 'source-serif-4-latin-400-normal.woff2'),
  'Printed Serif',
);
GlobalFonts.registerFromPath(
  shipped('@fontsource/courier-prime', 'courier-prime-latin-400-normal.woff2'),
  'Printed Typewriter',
);

const dpi = 300;
export const faces = { serif: 'Printed Serif', typewriter: 'Printed Typewriter' } as const;

/** Something on the sheet, in inches from its upper left corner. */
export type Mark = { text: string; x: number; y: number; points?: number } | { rule: [number, number, number, number] };

/** A sheet as an office scanner of 300 dots an inch gives it: leaning by so many degrees, blurred, specked, tinted. */
export async function scanned(
  marks: readonly Mark[],
  { face, leanDegrees }: { face: keyof typeof faces; leanDegrees: number },
): Promise<Buffer> {
  const canvas = createCanvas(8.5 * dpi, 11 * dpi);
  const pen = canvas.getContext('2d');
  pen.fillStyle = '#f1eee4';
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.fillStyle = pen.strokeStyle = '#2a2826';
  pen.lineWidth = 3;
  for (const mark of marks) {
    if ('text' in mark) {
      pen.font = `${((mark.points ?? 10.5) / 72) * dpi}px "${faces[face]}"`;
      pen.fillText(mark.text, mark.x * dpi, mark.y * dpi);
    } else {
      const [x0, y0, x1, y1] = mark.rule.map((inches) => inches * dpi) as [number, number, number, number];
      pen.beginPath();
      pen.moveTo(x0, y0);
      pen.lineTo(x1, y1);
      pen.stroke();
    }
  }
  // The same specks every time: a run of the generator of Park and Miller (Comm. ACM 31(10), 1988).
  let state = 20;
  const next = (): number => (state = (state * 48271) % 2147483647) / 2147483647;
  for (let speck = 0; speck < 120; speck += 1)
    pen.fillRect(next() * canvas.width, next() * canvas.height, 1 + next() * 2, 1 + next() * 2);
  const leaning = await sharp(canvas.toBuffer('image/png'))
    .flatten({ background: '#f1eee4' })
    .rotate(leanDegrees, { background: '#f1eee4' })
    .blur(0.9)
    .jpeg({ quality: 80 })
    .toBuffer();
  return leaning;
}

/** Lines of text one below the other, from the given place on. */
export const linesAt = (x: number, y: number, lines: readonly string[], leadInches = 0.2): Mark[] =>
  lines.map((text, at) => ({ text, x, y: y + at * leadInches }));
