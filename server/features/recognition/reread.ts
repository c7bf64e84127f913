import type { Zone } from '#shared/document/define-block.ts';
import { type DoubtfulCell, betterReading, doubtfulCells, withCellsReplaced } from '#shared/reading/doubtful-cells.ts';
import { lookedAt } from '#shared/reading/glyphs/look.ts';
import { mergedLabels } from '#shared/reading/labels.ts';
import { type GreyPicture, blankPicture } from '#shared/reading/picture/grey.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import { repairWords } from '#shared/reading/repair.ts';
import { recognise } from './engine.ts';
import { encoded } from './prepare.ts';

/** Paper around a cut-out cell, in pixels of the picture: without any the engine loses the first and the last letter. */
const margin = 14;
/** How far the cut goes beyond the words' boxes, which are a little tight at times. */
const beyond = 5;
/** An empty cell with fewer dark pixels than a full stop has is empty. */
const fewestInkPixels = 30;
const darkBelow = 150;

type Picture = { picture: GreyPicture; scale: number; dpi: number };

/** Reads doubtful cells of tables once more, each as a single line, and keeps the more confident reading. */
export async function rereadCells(words: readonly ReadingWord[], picture: Picture): Promise<ReadingWord[]> {
  const replaced: { cell: DoubtfulCell; by: readonly ReadingWord[] }[] = [];
  // Cells are found in repaired words, but it is the words as read that are compared and replaced.
  const rawOf = new Map(repairWords(words).map((word, index) => [word, words[index]]));
  for (const cell of doubtfulCells([...rawOf.keys()])) {
    const own = cell.words.flatMap((word) => rawOf.get(word) ?? []);
    const again = await readPiece(cell.zone, picture, 'line');
    const better = betterReading(own, again);
    if (better !== own) replaced.push({ cell: { zone: cell.zone, words: own }, by: better });
  }
  return withCellsReplaced(words, replaced);
}

/** Reads each drawing once more on its own, its lines in place, in no order: for labels that the page's reading lost. */
export async function rereadFigures(
  words: readonly ReadingWord[],
  figures: readonly Zone[],
  picture: Picture,
): Promise<ReadingWord[]> {
  let merged = [...words];
  for (const zone of figures) merged = mergedLabels(merged, await readPiece(zone, picture, 'labels'), zone);
  return merged;
}

/** A page number must be read as surely as this: what is left of a shadow reads as letters too. */
const surelyRunning = 60;

/** Reads lines at the head or the foot of the page that the page's reading passed over. */
export async function readMargins(
  words: readonly ReadingWord[],
  zones: readonly Zone[],
  picture: Picture,
): Promise<ReadingWord[]> {
  const added = [...words];
  for (const zone of zones) {
    const read = await readPiece(zone, picture, 'line');
    const line = Math.max(0, ...added.map((word) => word.line)) + 1;
    const isSure = read.every(({ confidence }) => confidence >= surelyRunning);
    if (isSure) added.push(...read.map((word) => ({ ...word, line })));
  }
  return added;
}

/** Reads one zone, whose box and whose words' boxes are those of the page as shown; the picture is `scale` times as large. */
export async function readPiece(
  zone: Zone,
  { picture, scale, dpi }: Picture,
  segmentation: 'line' | 'labels' | 'one-column',
): Promise<ReadingWord[]> {
  const [x, y, width, height] = zone.map((each) => Math.round(each * scale)) as Zone;
  const area: Zone = [x - beyond, y - beyond, width + 2 * beyond, height + 2 * beyond];
  const piece = cut(picture, area);
  if (piece === null) return [];
  const read = await recognise(encoded(piece), { segmentation, dpi });
  const printed = read.filter(({ text }) => text.trim() !== '');
  return lookedAt(printed, piece).map((word) => {
    const [bx, by, bw, bh] = word.box;
    const box = [bx + area[0] - margin, by + area[1] - margin, bw, bh].map((each) => Math.round(each / scale));
    return { ...word, box: box as Zone };
  });
}

/** The piece of the picture on white paper; null where there is no ink in it. */
function cut(picture: GreyPicture, [x, y, width, height]: Zone): GreyPicture | null {
  if (width < 3 || height < 3) return null;
  const piece = blankPicture(width + 2 * margin, height + 2 * margin);
  let ink = 0;
  for (let row = 0; row < height; row += 1) {
    if (y + row < 0 || y + row >= picture.height) continue;
    for (let column = 0; column < width; column += 1) {
      if (x + column < 0 || x + column >= picture.width) continue;
      const level = picture.data[(y + row) * picture.width + x + column] ?? 255;
      if (level < darkBelow) ink += 1;
      piece.data[(row + margin) * piece.width + column + margin] = level;
    }
  }
  return ink < fewestInkPixels ? null : piece;
}
