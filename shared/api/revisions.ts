import { z } from 'zod';
import { id, listOf, listQuery, pageParams, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { documentJson, page } from './pages.ts';

export const revisionOrigins = ['machine', 'person'] as const;

export const revisionSummary = z.object({
  number: z.number().int(),
  origin: z.enum(revisionOrigins),
  author: z.string(),
  note: z.string(),
  savedAt: time,
  doubtCount: z.number().int(),
});
export type RevisionSummary = z.infer<typeof revisionSummary>;

export const revision = revisionSummary.extend({ pageId: id, document: documentJson });
const oneParams = pageParams.extend({ number: z.coerce.number().int().positive() });
const note = z.string().trim().max(500).optional();

export const listRevisions = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/revisions',
  summary: 'The revisions of a page, newest first',
  action: 'read-manuals',
  params: pageParams,
  query: listQuery,
  reply: listOf(revisionSummary),
});

export const getRevision = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/revisions/:number',
  summary: 'One revision with its document',
  action: 'read-manuals',
  params: oneParams,
  reply: revision,
});

export const saveDocument = defineEndpoint({
  method: 'put',
  path: '/api/pages/:pageId/document',
  summary: 'Save the document as a new revision; 409 with the current one if based on an older',
  action: 'edit-pages',
  params: pageParams,
  body: z.object({ baseRevision: z.number().int().nonnegative(), document: documentJson, note }),
  reply: revision,
});

export const saveTogether = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/revisions',
  summary:
    'Make a revision of what people wrote together since the last one; answers the current one if that is nothing',
  action: 'edit-pages',
  params: pageParams,
  body: z.object({ note }).optional(),
  reply: revision,
});

export const restoreRevision = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/revisions/:number/restore',
  summary: 'Make a new revision that is as an older one was',
  action: 'edit-pages',
  params: oneParams,
  body: z.object({ note }).optional(),
  reply: revision,
});

export const signPage = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/proofed',
  summary:
    'Sign a page off as proofed; its newest text must be by others. Doubts that are left must be named by their count',
  action: 'edit-pages',
  params: pageParams,
  body: z.object({ revision: z.number().int().positive(), doubts: z.number().int().nonnegative().default(0) }),
  reply: page,
});

export const takeBackSignature = defineEndpoint({
  method: 'delete',
  path: '/api/pages/:pageId/proofed',
  summary: 'Take back that a page is proofed',
  action: 'edit-pages',
  params: pageParams,
  reply: page,
});

const cellPlace = z.tuple([z.number().int().nonnegative(), z.number().int().nonnegative()]);

export const restorePart = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/revisions/:number/restore-part',
  summary: 'Bring one block, or one cell of a table, of an older revision back; 409 if the page was saved meanwhile',
  action: 'edit-pages',
  params: oneParams,
  body: z.object({
    baseRevision: z.number().int().positive(),
    block: id,
    cell: z.object({ from: cellPlace, to: cellPlace }).optional(),
  }),
  reply: revision,
});

export const listBlockAuthors = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/authors',
  summary: 'Who wrote each block of a page: the last revision in which its text changed',
  action: 'read-manuals',
  params: pageParams,
  reply: z.object({
    items: z.array(z.object({ block: z.string(), kind: z.string(), words: z.string(), revision: revisionSummary })),
  }),
});
