import { z } from 'zod';

/** What can be wrong with the picture of a page, in a word or two. */
export const warningWords: Record<WarningKind, string> = {
  'nearly-blank': 'nearly blank',
  'low-resolution': 'coarse picture',
  soft: 'out of focus',
  faint: 'pale print',
  speckled: 'many specks',
  'turn-unsure': 'which way up?',
  'low-confidence': 'read with doubt',
  'double-page': 'two pages?',
  'text-layer-differs': 'text differs',
};

/** What an archivist may do about it. */
export const warningAdvice = {
  'nearly-blank': 'If something is printed there, scan the sheet again; else it may stay as it is.',
  'low-resolution': 'Scan the sheet again at 300 dots an inch, or compare its numbers with the paper one by one.',
  soft: 'The print is out of focus. Scan the sheet again, flat on the glass.',
  faint: 'The print is pale. Scan the sheet again, darker.',
  speckled: 'The picture is full of specks. Clean the glass or scan in grey instead of black and white.',
  'turn-unsure': 'Look whether the page stands upright, and turn it by hand if it does not.',
  'low-confidence': 'Much of this page was read with doubt. Compare it with the paper, or scan the sheet again.',
  'double-page': 'If these are two pages side by side, divide the picture.',
  'text-layer-differs': 'The text that came with the file differs from what is printed. It was read afresh.',
} as const satisfies Record<string, string>;

export type WarningKind = keyof typeof warningAdvice;

/** Something that is wrong with the picture of a page: `says` states what was found, with its figure. */
export const readingWarning = z.object({
  kind: z.enum(Object.keys(warningAdvice) as [WarningKind]),
  says: z.string(),
});
export type ReadingWarning = z.infer<typeof readingWarning>;
