import { z } from 'zod';
import { columnMeanings, tableKinds } from '#shared/document/blocks/table.ts';
import { zone } from '#shared/document/define-block.ts';
import { readingBlock, readingWord, recipe, recipeWish, transform } from '#shared/reading/reading.ts';
import { readingWarning } from '#shared/reading/page-warning.ts';
import { id, listOf, listQuery, manualParams, ok, pageParams, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

export const pageStates = ['waiting', 'reading', 'read', 'failed', 'corrected', 'proofed'] as const;
export type PageState = (typeof pageStates)[number];

/** Which half of a double-page spread a page is. */
export const pageHalves = ['whole', 'left', 'right'] as const;
export type PageHalf = (typeof pageHalves)[number];

export const pageSummary = z.object({
  id,
  position: z.number().int(),
  label: z.string(),
  state: z.enum(pageStates),
  confidence: z.number().nullable(),
  doubtCount: z.number().int(),
  revision: z.number().int(),
  problem: z.string().nullable(),
  half: z.enum(pageHalves),
  /** What the last reading found wrong with the picture. */
  warnings: z.array(readingWarning),
  /** Changes with the page image, and with nothing else; null until there is one. Goes into the image's address as `v`. */
  imageVersion: z.string().nullable(),
});
export type PageSummary = z.infer<typeof pageSummary>;

export const documentJson = z.record(z.string(), z.unknown());

/** An editor who did not write the text read it through and found it right. */
export const signOff = z.object({
  signedBy: z.string(),
  signedAt: time,
  /** Doubts that were left when it was signed. */
  doubtCount: z.number().int(),
});

export const page = pageSummary.extend({
  manualId: id,
  width: z.number().int().nullable(),
  height: z.number().int().nullable(),
  document: documentJson.nullable(),
  zones: z.array(z.object({ block: z.string(), kind: z.string(), box: zone })),
  /** Of the newest revision; null unless the page is proofed. */
  signOff: signOff.nullable(),
  /** The ids of the people who wrote the newest text, and so cannot sign it off. */
  authorIds: z.array(id),
});
export type Page = z.infer<typeof page>;

export const listPages = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/pages',
  summary: 'The pages of a manual in order',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery.extend({ limit: z.coerce.number().int().min(1).max(5000).default(5000) }),
  reply: listOf(pageSummary),
});

export const getPage = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId',
  summary: 'One page with its current document and zones',
  action: 'read-manuals',
  params: pageParams,
  reply: page,
});

export const updatePage = defineEndpoint({
  method: 'patch',
  path: '/api/pages/:pageId',
  summary: 'Change the printed label of a page',
  action: 'edit-pages',
  params: pageParams,
  body: z.object({ label: z.string().trim().min(1).max(40) }),
  reply: pageSummary,
});

export const getPageImage = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/image',
  summary: 'The page image as read (upright and straight), whole or one zone of it, at a width',
  action: 'read-manuals',
  params: pageParams,
  query: z.object({
    width: z.coerce.number().int().min(16).max(12_000).optional(),
    zone: z
      .string()
      .regex(/^\d+,\d+,\d+,\d+$/)
      .optional(),
    v: z.string().optional(),
  }),
  reply: z.string(),
  replyKind: 'file',
});

export const getPageText = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/text',
  summary: 'The current document as plain text in reading order, tables as tab-separated rows',
  action: 'read-manuals',
  params: pageParams,
  reply: z.string(),
  replyKind: 'text',
});

export const getPageTables = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/tables',
  summary: 'The tables of a page as cells of text',
  action: 'read-manuals',
  params: pageParams,
  reply: z.object({
    items: z.array(
      z.object({
        id: z.string(),
        kind: z.enum(tableKinds),
        columns: z.array(z.object({ heading: z.string(), meaning: z.enum(columnMeanings) })),
        rows: z.array(z.array(z.string())),
      }),
    ),
  }),
});

export const getPageReading = defineEndpoint({
  method: 'get',
  path: '/api/pages/:pageId/reading',
  summary: 'The newest reading of a page: words, boxes, confidences and the recipe used',
  action: 'read-manuals',
  params: pageParams,
  reply: z.object({
    id,
    recipe,
    confidence: z.number(),
    width: z.number().int(),
    height: z.number().int(),
    transform,
    words: z.array(readingWord),
    blocks: z.array(readingBlock),
    warnings: z.array(readingWarning).optional(),
    createdAt: time,
  }),
});

export const readAgain = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/readings',
  summary: 'Read the page again, with wishes for the recipe',
  action: 'run-recognition',
  params: pageParams,
  body: z.object({ recipe: recipeWish.optional() }).optional(),
  reply: pageSummary,
  status: 202,
});

export const lookAtPage = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/attention',
  summary: 'Somebody is looking at this page: read it before others',
  action: 'read-manuals',
  params: pageParams,
  reply: ok,
});

export const dividePage = defineEndpoint({
  method: 'post',
  path: '/api/pages/:pageId/division',
  summary: 'Divide the picture of a double-page spread: the page becomes its left half, a new page behind it the right',
  action: 'run-recognition',
  params: pageParams,
  body: z.object({ cutShare: z.number().min(0.2).max(0.8).default(0.5) }).optional(),
  reply: z.object({ items: z.array(pageSummary) }),
  status: 202,
});

export const joinPage = defineEndpoint({
  method: 'delete',
  path: '/api/pages/:pageId/division',
  summary:
    'Take a division back: the two halves of a spread become one page again, as long as nobody has worked on them',
  action: 'run-recognition',
  params: pageParams,
  reply: pageSummary,
  status: 202,
});
