import { z } from 'zod';
import { id, listOf, manualParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

/** Where a page's text is shared while it is corrected: a websocket of this server, speaking the Yjs protocol. */
export const coeditingPath = '/api/co-editing';

/** Who has a page open to correct it. */
export const pagePresence = z.object({ pageId: id, people: z.array(z.object({ id, name: z.string() })) });
export type PagePresence = z.infer<typeof pagePresence>;

export const listPresence = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/presence',
  summary: 'Who has which pages of a manual open to correct them, at this moment',
  action: 'read-manuals',
  params: manualParams,
  reply: listOf(pagePresence),
});
