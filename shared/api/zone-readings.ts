import { z } from 'zod';
import { zone } from '#shared/document/define-block.ts';
import { readingWord } from '#shared/reading/reading.ts';
import { pageParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { documentJson } from './pages.ts';

/** How a zone is looked at: lines of text or of a table, one line such as a cell, or the scattered lettering of a drawing. */
export const zoneKinds = ['text', 'line', 'lettering'] as const;
export type ZoneKind = (typeof zoneKinds)[number];

export const zoneReading = z.object({
  words: z.array(readingWord),
  /** The same as blocks of a page document, for putting in place of what stands there. */
  blocks: z.array(documentJson),
  /** Mean of the words' confidences by letters, 0 to 100; 0 where nothing was read. */
  confidence: z.number(),
});
export type ZoneReading = z.infer<typeof zoneReading>;

export const readZone = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/zone-readings',
  summary: 'Read one zone of the page image again and say what it reads; nothing is changed',
  action: 'edit-pages',
  params: pageParams,
  body: z.object({ zone, as: z.enum(zoneKinds).default('text') }),
  reply: zoneReading,
});
