import { z } from 'zod';

/** What may be amiss with a page's picture or its reading, in the archivist's words: in brief, and with what may be done. */
export const warningKinds = {
  'low-resolution': {
    brief: 'coarse scan',
    says: 'The scan is coarse. Small figures may be wrong: scan it anew at 300 dots an inch if you can.',
  },
  soft: { brief: 'blurred', says: 'The scan is out of focus or blurred. Letters run into each other.' },
  faint: { brief: 'faint print', says: 'The print is faint: it stands out little from the paper.' },
  speckled: {
    brief: 'specks',
    says: 'The scan is full of specks. Points and commas may be dirt, and dirt may be read as letters.',
  },
  uneven: { brief: 'uneven light', says: 'The light on the page is uneven: a shadow or a stain lies over part of it.' },
  'nearly-blank': {
    brief: 'nearly blank',
    says: 'There is next to nothing to read on this page. What looked like dirt was left out.',
  },
  'turn-unsure': {
    brief: 'which way up?',
    says: 'It is not sure which way up this page belongs. Check that it stands upright.',
  },
  'low-confidence': {
    brief: 'read with doubt',
    says: 'Much of this page was read with doubt. Compare all of it with the scan.',
  },
  'double-page': {
    brief: 'two pages?',
    says: 'This looks like two pages side by side. If it is, divide the picture: each half is then read by itself.',
  },
  'text-differs': {
    brief: 'text differs',
    says: 'The text that came with the file is not what is printed here, so the picture was read instead.',
  },
} as const satisfies Record<string, { brief: string; says: string }>;
export type WarningKind = keyof typeof warningKinds;

/** `detail` holds the figure behind the warning, for those who want to know. */
export const readingWarning = z.object({
  kind: z.enum(Object.keys(warningKinds) as [WarningKind]),
  detail: z.string(),
});
export type ReadingWarning = z.infer<typeof readingWarning>;
