import { z } from 'zod';
import { zone } from '#shared/document/define-block.ts';
import type { ReadingWarning } from './page-warning.ts';

/** One recognised word: `text` after repair, `raw` as the engine gave it; box in pixels of the page image as read. */
export const readingWord = z.object({
  text: z.string(),
  raw: z.string(),
  confidence: z.number(),
  box: zone,
  line: z.number().int(),
  block: z.number().int(),
  /** The text differs from `raw` and the grammar leaves no other reading: not a doubt. */
  sure: z.boolean().optional(),
  /** What the picture shows, where it was looked at for a sign that the engine cannot write and shows it surely. */
  seen: z.string().optional(),
});
export type ReadingWord = z.infer<typeof readingWord>;

export const readingBlock = z.object({ kind: z.string(), box: zone });

const row = z.tuple([z.number(), z.number(), z.number()]);
/** Takes a point of the page image as read to the source image as delivered: [[a, b, c], [d, e, f]]. */
export const transform = z.tuple([row, row]);
export type Transform = z.infer<typeof transform>;

/** What was done to the picture and to the engine for this reading. */
export const recipe = z.object({
  engine: z.string(),
  language: z.string(),
  segmentation: z.enum(['one-column', 'columns']),
  dpi: z.number(),
  skewDegrees: z.number(),
  rulesRemoved: z.boolean(),
  flattened: z.boolean(),
  /** How far the page was turned clockwise to stand upright; readings made before this was done have none. */
  turnDegrees: z.literal([0, 90, 180, 270]).optional(),
  /** Whose words they are: recognised in the picture, or those that the file itself carries, where it has them. */
  wordsFrom: z.enum(['picture', 'file']).optional(),
});
export type Recipe = z.infer<typeof recipe>;

/** The parts of a recipe that an archivist may set by hand; what is left out is decided from the picture. */
export const recipeWish = recipe
  .pick({
    segmentation: true,
    skewDegrees: true,
    rulesRemoved: true,
    flattened: true,
    turnDegrees: true,
    wordsFrom: true,
  })
  .partial()
  .extend({ skewDegrees: z.number().min(-45).max(45).optional() });
export type RecipeWish = z.infer<typeof recipeWish>;

/** One pass of recognition over one page image. `figures` are zones of drawings found in the picture. */
export type Reading = {
  recipe: Recipe;
  confidence: number;
  width: number;
  height: number;
  transform: Transform;
  words: ReadingWord[];
  figures: z.infer<typeof zone>[];
  /** What is amiss with the picture or the reading; readings made before this was judged have none. */
  warnings?: ReadingWarning[];
};

/** Mean confidence, 0 to 100. By letters, not by words: a stray speck must not weigh as much as a line. */
export function meanConfidence(words: readonly ReadingWord[]): number {
  const letters = words.reduce((sum, { text }) => sum + text.length, 0);
  return letters === 0 ? 0 : words.reduce((sum, { text, confidence }) => sum + confidence * text.length, 0) / letters;
}
