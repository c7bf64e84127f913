import { z } from 'zod';
import { zone } from './define-block.ts';

/** Why a stretch of text is in doubt. The words shown for each stand in `doubtReasons`. */
export const doubtReasons = {
  'low-confidence': 'Recognition was unsure of this',
  'sign-guessed': 'The sign was worked out from the unit, not read',
  'looks-otherwise': 'Its figures look like others of the page than it was read as',
  'read-differently': 'Another reading of the scan says otherwise',
  'corrected-elsewhere': 'The same reading was corrected on another page of this manual',
  'odd-part-number': 'No part number on the corrected pages has this shape',
  'odd-number': 'This does not look like a number that could be printed here',
} as const;

/**
 * Marks that may stand on text. `word` ties a stretch to its place on the scan, with the engine's confidence (0 to 100);
 * `doubt` says that recognition or a check is unsure of it, until a person settles it.
 */
export const marks = {
  bold: z.object({}),
  italic: z.object({}),
  underline: z.object({}),
  word: z.object({ zone, confidence: z.number().min(0).max(100) }),
  doubt: z.object({
    reason: z.enum(Object.keys(doubtReasons) as [keyof typeof doubtReasons]),
    proposals: z.array(z.string().max(200)).max(8).default([]),
  }),
} as const satisfies Record<string, z.ZodObject>;

export type MarkKind = keyof typeof marks;

export type DoubtMark = z.infer<(typeof marks)['doubt']>;
