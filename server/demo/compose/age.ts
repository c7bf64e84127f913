/** Gives a fresh page its years: thin ribbon, brown paper, dust, and a tired scanner. */
import sharp from 'sharp';
import type { InkMap } from './draw-page.ts';
import type { Look } from './looks.ts';
import { type Random, swing, unevenness } from './random.ts';
import { dotsPerInch } from './sheet.ts';

interface GreyPage {
  readonly width: number;
  readonly height: number;
  readonly grey: Uint8Array;
}

/** Distances in dots over which ribbon, paper and grain change. */
const ribbonCell = 210;
const stainCell = 520;
const fibreCell = 4;

/** Ink soaks into the paper: from this much of 255 on, a dot is as black as it gets. */
const soaked = 160;

/** Grey of the scanner's lid, seen where the sheet does not reach and through its holes. */
const lidGrey = 78;
/** The sheet is a little larger than what is scanned of it. */
const overlap = 10;
const holeRadius = 0.135 * dotsPerInch;

const jpegQuality = 58;

export async function age(ink: InkMap, look: Look, random: Random): Promise<Buffer> {
  const raw = { width: ink.width, height: ink.height, channels: 1 } as const;
  const spread = await sharp(ink.cover, { raw }).blur(look.blur).toColourspace('b-w').raw().toBuffer();
  const page = print({ ...ink, cover: spread }, look, random);
  punch(page, look, random);
  for (let speck = 0; speck < look.specks; speck += 1) soil(page, random);
  return sharp(page.grey, { raw })
    .toColourspace('b-w')
    .withMetadata({ density: dotsPerInch })
    .jpeg({ quality: jpegQuality, mozjpeg: true })
    .toBuffer();
}

function print(ink: InkMap, look: Look, random: Random): GreyPage {
  const { width, height } = ink;
  const ribbon = unevenness(random, ink, ribbonCell);
  const fibre = unevenness(random, ink, fibreCell);
  const paper = paperOf(ink, look, random);
  const grey = new Uint8Array(width * height);
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const index = y * width + x;
      const light = paper(x, y) + look.grain * swing(random);
      const cover = Math.min(1, (ink.cover[index] ?? 0) / soaked);
      const strike = cover === 0 ? 0 : 1 - look.uneven * ribbon(x, y) - 0.8 * look.uneven * fibre(x, y);
      grey[index] = Math.max(0, Math.min(255, light * (1 - look.ink * cover * strike)));
    }
  }
  return { width, height, grey };
}

/** The light falls off to one side and towards the spine; the paper has darkened in clouds. */
function paperOf(size: { width: number; height: number }, look: Look, random: Random) {
  const stain = unevenness(random, size, stainCell);
  const fromRight = random() < 0.5;
  const edge = edgeOf(size, look);
  return (x: number, y: number): number => {
    const outside = edge(x, y);
    if (outside > 0) return lidGrey;
    const across = fromRight ? x / size.width : 1 - x / size.width;
    const falling = look.shade * (0.55 * across * across + 0.25 * (y / size.height));
    // Browned rim: the outer quarter inch of an old sheet.
    const rim = 14 * Math.max(0, 1 + outside / 75);
    return look.paper - falling - 0.35 * look.shade * stain(x, y) - rim;
  };
}

/** Dots beyond the nearest edge of the skewed sheet, negative inside it. */
function edgeOf({ width, height }: { width: number; height: number }, { skewDegrees }: Look) {
  const angle = (-skewDegrees * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return (x: number, y: number): number => {
    const [fromX, fromY] = [x - width / 2, y - height / 2];
    const across = Math.abs(fromX * cos - fromY * sin) - width / 2;
    const down = Math.abs(fromX * sin + fromY * cos) - height / 2;
    return Math.max(across, down) - overlap;
  };
}

/** File holes in the left margin, the skew seen. */
function punch(page: GreyPage, look: Look, random: Random): void {
  const slope = Math.tan((look.skewDegrees * Math.PI) / 180);
  const heights = look.holes === 1 ? [0.36] : [0.36, 0.64];
  for (const part of heights.slice(0, look.holes)) {
    const y = part * page.height;
    const x = 0.42 * dotsPerInch - slope * (y - page.height / 2) + 4 * swing(random);
    darken(page, { x, y, radius: holeRadius }, () => lidGrey - 20);
  }
}

function soil(page: GreyPage, random: Random): void {
  const spot = { x: random() * page.width, y: random() * page.height, radius: 0.8 + 2.6 * random() ** 3 };
  const left = 0.35 + 0.5 * random();
  darken(page, spot, (grey) => grey * left);
}

function darken(
  { width, height, grey }: GreyPage,
  { x, y, radius }: { x: number; y: number; radius: number },
  change: (grey: number) => number,
): void {
  for (let row = Math.ceil(y - radius); row <= y + radius; row += 1) {
    for (let column = Math.ceil(x - radius); column <= x + radius; column += 1) {
      const inside = (row - y) ** 2 + (column - x) ** 2 <= radius ** 2;
      if (!inside || row < 0 || row >= height || column < 0 || column >= width) continue;
      grey[row * width + column] = change(grey[row * width + column] ?? 0);
    }
  }
}
