import { z } from 'zod';
import { id, listOf, listQuery, manualParams, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const sourceStates = ['ready', 'refused', 'duplicate'] as const;

/** A file that was uploaded. `refused` ones were not kept; `duplicate` ones point at the source that holds the same bytes. */
export const source = z.object({
  id,
  manualId: id,
  fileName: z.string(),
  sha256: z.string(),
  bytes: z.number().int(),
  mediaType: z.string(),
  pageCount: z.number().int().nullable(),
  state: z.enum(sourceStates),
  problem: z.string().nullable().optional(),
  createdAt: time,
});
export type Source = z.infer<typeof source>;

export const listSources = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/sources',
  summary: 'The files that a manual was taken in from',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery,
  reply: listOf(source),
});

export const uploadSources = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/sources',
  summary: 'Upload files: PDF, multi-page TIFF, PNG, JPEG, WebP. Each is answered for by itself',
  action: 'upload-sources',
  params: manualParams,
  filesField: 'files',
  reply: z.object({ items: z.array(source) }),
  status: 202,
});

export const downloadSource = defineEndpoint({
  method: 'get',
  path: '/api/sources/:sourceId/file',
  summary: 'The file as it was uploaded, byte for byte',
  action: 'read-manuals',
  params: z.object({ sourceId: id }),
  reply: z.string(),
  replyKind: 'file',
});
