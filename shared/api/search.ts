import { z } from 'zod';
import { zone } from '#shared/document/define-block.ts';
import { id, listQuery } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const searchKinds = ['text', 'part', 'quantity'] as const;

/** `snippet` is plain text; `marks` are the stretches of it that were hit, as [start, end) offsets. */
export const searchHit = z.object({
  kind: z.enum(searchKinds),
  manualId: id,
  manualTitle: z.string(),
  pageId: id.nullable(),
  label: z.string(),
  snippet: z.string(),
  marks: z.array(z.tuple([z.number().int(), z.number().int()])),
  boxes: z.array(zone),
  score: z.number(),
});
export type SearchHit = z.infer<typeof searchHit>;

export const search = defineEndpoint({
  method: 'get',
  path: '/api/search',
  summary: 'Find text, parts and quantities across the manuals',
  action: 'search',
  query: listQuery.extend({
    limit: z.coerce.number().int().min(1).max(200).default(50),
    q: z.string().trim().min(1, 'Type something to look for.').max(200),
    manualId: id.optional(),
    kind: z.enum(searchKinds).optional(),
  }),
  reply: z.object({ items: z.array(searchHit), nextCursor: z.string().nullable(), close: z.boolean() }),
});
