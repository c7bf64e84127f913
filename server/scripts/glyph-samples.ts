import { existsSync, readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { GlobalFonts, type SKRSContext2D, createCanvas } from '@napi-rs/canvas';
import { inkBox, patchOf } from '#shared/reading/glyphs/patch.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';

const require = createRequire(import.meta.url);
const shipped = (name: string, file: string): string =>
  path.join(path.dirname(require.resolve(`${name}/package.json`)), 'files', file);

/** Faces of the packages here, and those that a Debian machine may have: a missing one is left out. */
const candidates = [
  shipped('@fontsource/source-serif-4', 'source-serif-4-latin-400-normal.woff2'),
  shipped('@fontsource/courier-prime', 'courier-prime-latin-400-normal.woff2'),
  shipped('@fontsource/special-elite', 'special-elite-latin-400-normal.woff2'),
  ...[
    'C059-Roman',
    'C059-Bold',
    'NimbusRoman-Regular',
    'NimbusRoman-Bold',
    'NimbusSans-Regular',
    'NimbusSans-Bold',
    'NimbusSansNarrow-Regular',
    'NimbusMonoPS-Regular',
    'P052-Roman',
    'URWBookman-Light',
    'URWGothic-Book',
  ].map((name) => `/usr/share/fonts/opentype/urw-base35/${name}.otf`),
  '/usr/share/fonts/opentype/courier-prime/Courier Prime.otf',
  '/usr/share/fonts/opentype/courier-prime/Courier Prime Bold.otf',
  '/usr/share/fonts/opentype/courier-prime/Courier Prime Sans.otf',
  '/usr/share/fonts/truetype/gnutypewriter/GNUTypewriter.ttf',
  '/usr/share/fonts/truetype/routed-gothic/routed-gothic.ttf',
  ...['LiberationMono', 'LiberationSans', 'LiberationSerif'].map(
    (name) => `/usr/share/fonts/truetype/liberation/${name}-Regular.ttf`,
  ),
  ...['DejaVuSans', 'DejaVuSerif', 'DejaVuSansMono'].map((name) => `/usr/share/fonts/truetype/dejavu/${name}.ttf`),
];

/** Registers what faces there are and tells their names. */
export function registeredFaces(): string[] {
  return candidates
    .filter((file) => existsSync(file) && readdirSync(path.dirname(file)).length > 0)
    .flatMap((file) => {
      const name = path
        .basename(file)
        .replace(/(-latin.*)?\.\w+$/, '')
        .replace(/[ -]/g, '');
      return GlobalFonts.registerFromPath(file, `glyph ${name}`) === null ? [] : [name];
    });
}

const box = 96;
const baselineAt = 66;
const canvas = createCanvas(box, box);
const pen = canvas.getContext('2d');

type Look = {
  face: string;
  glyph: string;
  size: number;
  lean: number;
  at: number;
  setting?: Omit<Setting, 'size' | 'face'> | null;
};

/** Vulgar fractions as numerator and denominator; every face draws those it has, and all of them from their figures. */
export const fractions: Record<string, [string, string]> = {
  '½': ['1', '2'],
  '¼': ['1', '4'],
  '¾': ['3', '4'],
  '⅛': ['1', '8'],
  '⅜': ['3', '8'],
  '⅝': ['5', '8'],
  '⅞': ['7', '8'],
  '⅓': ['1', '3'],
  '⅔': ['2', '3'],
};

function drawn({ face, glyph, size, lean, at, setting = null }: Look): GreyPicture {
  pen.setTransform(1, 0, 0, 1, 0, 0);
  pen.fillStyle = 'white';
  pen.fillRect(0, 0, box, box);
  pen.fillStyle = 'black';
  pen.setTransform(1, 0, lean, 1, 0, 0);
  pen.translate(30 + at - lean * baselineAt, baselineAt + at / 2);
  if (glyph === flatThree) drawFlatThree(pen, size);
  else if (setting !== null) drawFraction(pen, fractions[glyph] ?? ['1', '2'], { ...setting, face, size });
  else {
    pen.font = `${size}px "glyph ${face}"`;
    pen.fillText(glyph, 0, 0);
  }
  const { data } = pen.getImageData(0, 0, box, box);
  return {
    width: box,
    height: box,
    data: Uint8Array.from({ length: box * box }, (_, pixel) => data[pixel * 4] ?? 255),
  };
}

type Setting = { face: string; size: number; figures: number; sunk: number; stroke: number; isStacked: boolean };

/** Figures above and below a stroke: slanting, as foundries cast them, or level, as printers stacked them. */
function drawFraction(on: SKRSContext2D, [above, below]: [string, string], setting: Setting): void {
  const { face, size, figures, sunk, stroke, isStacked } = setting;
  const small = size * figures;
  on.font = `${small}px "glyph ${face}"`;
  const wide = on.measureText(above).width;
  on.lineWidth = size * stroke;
  on.beginPath();
  if (isStacked) {
    on.fillText(above, 0, size * (sunk - 0.38));
    on.fillText(below, 0, size * (sunk + 0.18));
    on.moveTo(-size * 0.04, size * (sunk - 0.32));
    on.lineTo(wide + size * 0.04, size * (sunk - 0.32));
  } else {
    on.fillText(above, 0, size * (sunk - 0.36));
    on.fillText(below, wide + size * 0.06, size * (sunk + 0.06));
    on.moveTo(wide - size * 0.26, size * (sunk + 0.14));
    on.lineTo(wide + size * 0.34, size * (sunk - 0.82));
  }
  on.stroke();
}

/** The 3 of many typewriters before 1940: a bar on top, a stroke back to the middle, and a bowl. */
export const flatThree = 'flat 3';
function drawFlatThree(on: SKRSContext2D, size: number): void {
  on.lineWidth = size * 0.085;
  on.lineJoin = 'round';
  on.beginPath();
  on.moveTo(size * 0.08, -size * 0.5);
  on.lineTo(size * 0.08, -size * 0.6);
  on.lineTo(size * 0.46, -size * 0.6);
  on.lineTo(size * 0.2, -size * 0.36);
  on.bezierCurveTo(size * 0.66, -size * 0.4, size * 0.6, size * 0.02, size * 0.28, 0);
  on.bezierCurveTo(size * 0.14, 0, size * 0.06, -size * 0.04, size * 0.04, -size * 0.12);
  on.stroke();
}

/** Whether a face has a glyph of its own: what it lacks is drawn like an unknown face draws it. */
export function hasGlyph(face: string, glyph: string): boolean {
  const look = { glyph, size: 40, lean: 0, at: 0 };
  const own = drawn({ ...look, face });
  const other = drawn({ ...look, face: 'of no name' });
  const box0 = inkBox(own, [0, 0, box, box]);
  return box0 !== null && own.data.some((level, at) => level !== other.data[at]);
}

/** How high a capital of a face is, for a size of 1. */
export function capitalOf(face: string): number {
  const found = inkBox(drawn({ face, glyph: 'H', size: 60, lean: 0, at: 0 }), [0, 0, box, box]);
  return (found?.[3] ?? 42) / 60;
}

/** One aged sample: small, leaning, blurred, noisy, worn or clotted, sometimes of two levels only, and loosely measured. */
export function sample(
  { face, glyph, capital }: { face: string; glyph: string; capital: number },
  random: () => number,
): Float32Array | null {
  const between = (from: number, to: number): number => from + random() * (to - from);
  const tall = between(15, 34);
  const isComposed = glyph in fractions && (random() < 0.7 || !hasGlyph(face, glyph));
  const setting = isComposed
    ? {
        figures: between(0.46, 0.64),
        sunk: between(-0.02, 0.16),
        stroke: between(0.03, 0.08),
        isStacked: random() < 0.2,
      }
    : null;
  const look = { face, glyph, size: tall / capital, lean: between(-0.05, 0.05), at: between(0, 2) };
  const picture = drawn({ ...look, setting });
  const aged = worn(
    blurred(picture, between(0.3, 1.5) * (tall / 28)),
    { bias: between(-45, 40), noise: between(0, 14), isTwoLevel: random() < 0.25 },
    random,
  );
  const found = inkBox(aged, [0, 0, box, box]);
  if (found === null) return null;
  const baseline = baselineAt + between(-0.04, 0.04) * tall;
  return patchOf(aged, found, { baseline, capital: tall * between(0.93, 1.07) });
}

/** Two passes of a moving mean each way, which come close to a Gaussian of the given width in pixels. */
function blurred(picture: GreyPicture, sigma: number): GreyPicture {
  const share = Math.min(1, sigma / 1.6) / 2.4;
  let data = Float32Array.from(picture.data);
  for (let pass = 0; pass < (sigma > 0.9 ? 3 : 2); pass += 1) {
    for (const stride of [1, box]) {
      const from = data;
      data = from.map(
        (level, at) => level * (1 - 2 * share) + share * ((from[at - stride] ?? 255) + (from[at + stride] ?? 255)),
      );
    }
  }
  return { ...picture, data: Uint8Array.from(data) };
}

function worn(
  picture: GreyPicture,
  { bias, noise, isTwoLevel }: { bias: number; noise: number; isTwoLevel: boolean },
  random: () => number,
): GreyPicture {
  const data = picture.data.map((level) => {
    const moved = level === 255 ? 255 : level + bias * Math.sin((Math.PI * level) / 255) + (random() - 0.5) * 2 * noise;
    return isTwoLevel ? (moved < 128 ? 0 : 255) : Math.max(0, Math.min(255, moved));
  });
  return { ...picture, data };
}
