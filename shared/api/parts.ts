import { z } from 'zod';
import { id, listQuery, manualParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const partRow = z.object({
  refDes: z.string(),
  /** With ranges written out. */
  designators: z.array(z.string()),
  partNumber: z.string(),
  description: z.string(),
  quantity: z.string(),
  value: z.object({ magnitude: z.number(), unit: z.string(), tolerance: z.string().nullable() }).nullable(),
  /** The designator of the part that this one is said to be the same as. */
  sameAs: z.string().nullable(),
  pageId: id,
  pageLabel: z.string(),
  tableId: z.string(),
  row: z.number().int(),
  problems: z.array(z.string()),
});

export const listParts = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/parts',
  summary: 'Every parts row of the manual; format=csv answers text/csv',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery.extend({
    limit: z.coerce.number().int().min(1).max(20_000).default(20_000),
    format: z.enum(['json', 'csv']).default('json'),
  }),
  reply: z.object({ items: z.array(partRow), nextCursor: z.string().nullable() }),
});
