import { z } from 'zod';
import { id, manualParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const pageNumbers = z.object({
  pages: z.array(z.object({ pageId: id, label: z.string(), printed: z.string().nullable() })),
  problems: z.array(z.object({ pageId: id, says: z.string() })),
});

export const getPageNumbers = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/page-numbers',
  summary: 'The page numbers that the pages print, and where the row of them has a gap or a double',
  action: 'read-manuals',
  params: manualParams,
  reply: pageNumbers,
});
