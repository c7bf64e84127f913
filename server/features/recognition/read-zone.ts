import sharp from 'sharp';
import type { ZoneKind } from '#shared/api/zone-readings.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { mendTables } from '#shared/reading/mend-tables.ts';
import { flatten } from '#shared/reading/picture/flatten.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { removeLeaders } from '#shared/reading/picture/leaders.ts';
import { removeRules } from '#shared/reading/picture/rules.ts';
import type { ReadingWord } from '#shared/reading/reading.ts';
import { repairWords } from '#shared/reading/repair.ts';
import { coarsestDpi, readingDpi } from './prepare.ts';
import { readPiece } from './reread.ts';

export type ReadZoneInput = { image: string; dpi: number; zone: Zone; as: ZoneKind };

/** A rule is told from a stroke by its length, so the zone's surroundings are looked at too; inches. */
const surroundingInches = 0.5;
const segmentations = { text: 'one-column', line: 'line', lettering: 'labels' } as const;

/** Reads one zone of a page image that stands upright and straight. Boxes are in the image's pixels. Runs in a worker process. */
export async function readZone({ image, dpi, zone, as }: ReadZoneInput): Promise<ReadingWord[]> {
  const scale = dpi < coarsestDpi ? readingDpi / dpi : 1;
  const { left, top, picture } = await surroundings(image, zone, { scale, margin: surroundingInches * dpi });
  const even = flatten(picture);
  const readAt = Math.round(dpi * scale);
  // The lines of a drawing hold its lettering apart, as the page's own reading has it.
  const clean = as === 'lettering' ? even : removeLeaders(removeRules(even, readAt).picture, readAt).picture;
  const within: Zone = [zone[0] - left, zone[1] - top, zone[2], zone[3]];
  const words = await readPiece(within, { picture: clean, scale, dpi: readAt }, segmentations[as]);
  const placed = words.map((word) => ({
    ...word,
    box: [word.box[0] + left, word.box[1] + top, word.box[2], word.box[3]] as Zone,
  }));
  return mendTables(repairWords(placed));
}

async function surroundings(
  image: string,
  [x, y, w, h]: Zone,
  { scale, margin }: { scale: number; margin: number },
): Promise<{ left: number; top: number; picture: GreyPicture }> {
  const { width, height } = await sharp(image).metadata();
  const [left, top] = [Math.max(0, Math.floor(x - margin)), Math.max(0, Math.floor(y - margin))];
  const right = Math.min(width, Math.ceil(x + w + margin));
  const bottom = Math.min(height, Math.ceil(y + h + margin));
  const { data, info } = await sharp(image)
    .extract({ left, top, width: right - left, height: bottom - top })
    .resize({ width: Math.round((right - left) * scale), kernel: 'cubic' })
    .greyscale()
    .toColourspace('b-w')
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { left, top, picture: { width: info.width, height: info.height, data: new Uint8Array(data) } };
}
