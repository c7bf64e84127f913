import { fileURLToPath } from 'node:url';
import { GlobalFonts, type SKRSContext2D } from '@napi-rs/canvas';
import { largeScale } from './cursor.ts';
import type { Placed } from './placed.ts';
import { type Random, randomFrom, swing } from './random.ts';
import { columnWidth, type Pitch } from './sheet.ts';

export type Face = 'Demo Courier' | 'Demo Elite';
const boldFace = 'Demo Courier Bold';

const files: Readonly<Record<Face | typeof boldFace, string>> = {
  'Demo Courier': '@fontsource/courier-prime/files/courier-prime-latin-400-normal.woff2',
  'Demo Courier Bold': '@fontsource/courier-prime/files/courier-prime-latin-700-normal.woff2',
  'Demo Elite': '@fontsource/special-elite/files/special-elite-latin-400-normal.woff2',
};

export function registerFaces(): void {
  for (const [name, file] of Object.entries(files)) {
    const path = fileURLToPath(import.meta.resolve(file));
    if (GlobalFonts.registerFromPath(path, name) === null) throw new Error(`Cannot read the type face ${file}`);
  }
}

/** One machine: its face, and the way each of its type bars has come to stand and strike. */
export interface Typewriter {
  readonly face: Face;
  readonly random: Random;
}

/** A type bar is bent the same way each time its letter is struck. */
function barOf(face: Face, letter: string): { readonly rise: number; readonly drift: number; readonly weight: number } {
  const random = randomFrom(`${face} ${letter}`);
  return { rise: 2.6 * swing(random), drift: 2 * swing(random), weight: 0.86 + 0.14 * random() };
}

/** The two faces carry their underline at different depths. */
const underlineDrop: Readonly<Record<Face, number>> = { 'Demo Courier': 6, 'Demo Elite': 8 };

const emsPerColumn = 0.6;
const sizeFor = (pitch: Pitch): number => columnWidth(pitch) / emsPerColumn;

export function typeText(context: SKRSContext2D, machine: Typewriter, item: Extract<Placed, { kind: 'text' }>): void {
  const scale = item.large === true ? largeScale : 1;
  const width = columnWidth(item.pitch) * scale;
  const size = sizeFor(item.pitch) * scale;
  context.font = item.large === true ? `${size}px "${boldFace}"` : `${size}px "${machine.face}"`;
  context.textAlign = 'center';
  [...item.text].forEach((letter, index) => {
    if (letter !== ' ') strike(context, machine, { letter, x: item.x + (index + 0.5) * width, y: item.y, size });
    if (item.underlined === true)
      strike(context, machine, {
        letter: '_',
        x: item.x + (index + 0.5) * width,
        y: item.y + underlineDrop[machine.face],
        size,
      });
  });
  context.globalAlpha = 1;
}

function strike(
  context: SKRSContext2D,
  { face, random }: Typewriter,
  { letter, x, y, size }: { letter: string; x: number; y: number; size: number },
): void {
  const bar = barOf(face, letter);
  context.globalAlpha = bar.weight * (0.76 + 0.24 * random());
  const left = x + bar.drift + 0.7 * swing(random);
  const base = y + bar.rise + 0.6 * swing(random);
  if (letter === 'Ω') drawOmega(context, { x: left, y: base, size });
  else strikeType(context, letter, { x: left, y: base, size: face === 'Demo Elite' && lightly.has(letter) ? 0.72 : 1 });
}

/** A practised hand strikes the stops lightly, or they would cut the paper; the elite face has heavy ones. */
const lightly = new Set(['.', ',', ':']);

function strikeType(
  context: SKRSContext2D,
  letter: string,
  { x, y, size }: { x: number; y: number; size: number },
): void {
  context.save();
  context.translate(x, y);
  context.scale(size, size);
  context.fillText(letter, 0, 0);
  context.restore();
}

/** No typewriter had the letter: the typist left a blank, and it was put in by pen. */
function drawOmega(context: SKRSContext2D, { x, y, size }: { x: number; y: number; size: number }): void {
  const radius = 0.22 * size;
  context.lineWidth = 0.055 * size;
  context.beginPath();
  context.moveTo(x - 1.25 * radius, y);
  context.lineTo(x - 0.45 * radius, y);
  context.arc(x, y - 1.45 * radius, radius, 0.65 * Math.PI, 0.35 * Math.PI);
  context.lineTo(x + 0.45 * radius, y);
  context.lineTo(x + 1.25 * radius, y);
  context.stroke();
}
