import { z } from 'zod';
import { id } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { pageSummary } from './pages.ts';
import { pagePresence } from './presence.ts';

/** What the server tells open screens. Each is a hint to fetch anew, with enough in it to show progress at once. */
export const liveEvent = z.discriminatedUnion('type', [
  z.object({ type: z.literal('page'), manualId: id, page: pageSummary }),
  z.object({ type: z.literal('pages'), manualId: id }),
  z.object({ type: z.literal('source'), manualId: id, sourceId: id }),
  z.object({ type: z.literal('quantities'), manualId: id }),
  z.object({ type: z.literal('editions'), manualId: id }),
  z.object({ type: z.literal('comments'), manualId: id, pageId: id }),
  pagePresence.extend({ type: z.literal('presence'), manualId: id }),
  z.object({ type: z.literal('queue'), waiting: z.number().int(), active: z.number().int() }),
]);
export type LiveEvent = z.infer<typeof liveEvent>;

export const getEvents = defineEndpoint({
  method: 'get',
  path: '/api/events',
  summary: 'Server-sent events: page and source states, quantities, comments, editions, presence, the queue',
  action: 'read-manuals',
  reply: liveEvent,
  replyKind: 'events',
});
