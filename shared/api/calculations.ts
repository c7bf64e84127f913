import { z } from 'zod';
import { id, manualParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { inputs } from './quantities.ts';

export const changeRow = z.object({
  pageId: id.nullable(),
  pageLabel: z.string().nullable(),
  symbol: z.string(),
  label: z.string(),
  printed: z.string().nullable(),
  before: z.string(),
  after: z.string(),
  limits: z.enum(['leaves', 'returns', 'stays outside']).nullable(),
  problem: z.string().nullable(),
});

export const changeSheet = z.object({
  rows: z.array(changeRow),
  same: z.number().int(),
  leaving: z.number().int(),
  unavailable: z.number().int(),
});

export const getChangeSheet = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/change-sheet',
  summary:
    'Every value that differs between two settings, by page, and what passes out of its limits; as CSV on request',
  action: 'evaluate',
  params: manualParams,
  query: z.object({ format: z.enum(['json', 'csv']).default('json') }),
  body: z.object({ before: inputs.default({}), after: inputs.default({}) }),
  reply: changeSheet,
});
