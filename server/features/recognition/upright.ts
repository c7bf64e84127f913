import sharp from 'sharp';
import { flatten } from '#shared/reading/picture/flatten.ts';
import type { GreyPicture } from '#shared/reading/picture/grey.ts';
import { removeRules } from '#shared/reading/picture/rules.ts';
import { type Turn, turned, turns } from '#shared/reading/picture/turn.ts';
import { recognise } from './engine.ts';
import { encoded } from './prepare.ts';

/** The middle half each way: a quarter of the page says enough, and its rim says nothing. */
const cropShare = 0.5;
/** Words read with this confidence are words; on a page that lies wrong hardly any are. */
const surelyWord = 75;
/** Another turn must give so many times the letters of the page as it lies. */
const clearlyMore = 1.6;
const fewestLetters = 40;

/** The clockwise turn that sets a page upright: the one under which the middle of it reads best; as it lies when unsure. */
export async function uprightTurn(drawn: string, dpi: number): Promise<{ turn: Turn; isSure: boolean }> {
  const crop = await middleOf(drawn);
  const letters = new Map<Turn, number>();
  for (const turn of turns) letters.set(turn, await lettersIn(turned(crop, turn), dpi));
  const [best = [0, 0] as const] = [...letters].sort(([, a], [, b]) => b - a);
  const [turn, most] = best;
  const next = Math.max(...[...letters].map(([each, count]) => (each === turn ? 0 : count)));
  const isSure = most >= fewestLetters && most > next * clearlyMore;
  return { turn: isSure ? turn : 0, isSure };
}

async function middleOf(drawn: string): Promise<GreyPicture> {
  const { width, height } = await sharp(drawn).metadata();
  const [w, h] = [Math.round(width * cropShare), Math.round(height * cropShare)];
  const { data, info } = await sharp(drawn)
    .extract({ left: Math.round((width - w) / 2), top: Math.round((height - h) / 2), width: w, height: h })
    .greyscale()
    .toColourspace('b-w')
    .raw()
    .toBuffer({ resolveWithObject: true });
  return flatten({ width: info.width, height: info.height, data: new Uint8Array(data) });
}

async function lettersIn(picture: GreyPicture, dpi: number): Promise<number> {
  const words = await recognise(encoded(removeRules(picture, dpi).picture), { segmentation: 'one-column', dpi });
  return words
    .filter(({ text, confidence }) => confidence >= surelyWord && text.length > 1)
    .reduce((sum, { text }) => sum + text.length, 0);
}
