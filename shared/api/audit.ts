import { z } from 'zod';
import { id, listOf, listQuery, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const auditEntry = z.object({
  id,
  at: time,
  who: z.string(),
  did: z.string(),
  to: z.string(),
  subjectId: z.string().nullable(),
  details: z.record(z.string(), z.unknown()),
});

export const listAudit = defineEndpoint({
  method: 'get',
  path: '/api/audit',
  summary: 'Who changed what, newest first',
  action: 'see-audit',
  query: listQuery,
  reply: listOf(auditEntry),
});
