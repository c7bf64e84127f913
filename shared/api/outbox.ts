import { z } from 'zod';
import { id, listOf, listQuery, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const outboxMail = z.object({ id, at: time, to: z.string(), subject: z.string(), text: z.string() });

export const listOutbox = defineEndpoint({
  method: 'get',
  path: '/api/outbox',
  summary: 'E-mails kept here because no mail server is configured, newest first',
  action: 'see-outbox',
  query: listQuery,
  reply: listOf(outboxMail),
});
