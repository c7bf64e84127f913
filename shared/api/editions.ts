import { z } from 'zod';
import { frequencyPlan } from '#shared/plan/plan.ts';
import { channelTable } from './calculations.ts';
import { id, listOf, listQuery, manualParams, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';
import { page, pageStates } from './pages.ts';
import { quantity } from './quantities.ts';

const count = z.number().int();

/** What was known against an edition when it was published. */
export const editionStanding = z.object({
  pages: count,
  unread: count,
  notProofed: count,
  doubts: count,
  disagreeing: count,
});
export type EditionStanding = z.infer<typeof editionStanding>;

export const edition = z.object({
  id,
  number: count,
  /** May be '': then it is known by its number and date alone. */
  name: z.string(),
  note: z.string(),
  publishedBy: z.string(),
  publishedAt: time,
  standing: editionStanding,
  /** Where reading it begins. */
  firstPageId: id,
  withdrawn: z.object({ by: z.string(), at: time, reason: z.string() }).nullable(),
  /** The one that readers are shown: the newest that is not withdrawn. */
  isLatest: z.boolean(),
});
export type Edition = z.infer<typeof edition>;

export const editionPage = z.object({
  pageId: id,
  position: count,
  label: z.string(),
  state: z.enum(pageStates),
  revision: count,
  doubtCount: count,
  signedBy: z.string().nullable(),
});

const labelled = z.object({ pageId: id, label: z.string() });

/** What publishing now would make, and what speaks against it. */
export const editionDraft = z.object({
  number: count,
  pages: count,
  unread: z.array(labelled),
  notProofed: z.array(labelled),
  doubts: z.array(labelled.extend({ doubtCount: count })),
  beingWritten: z.array(labelled),
  disagreeing: z.array(z.object({ symbol: z.string(), printed: z.string(), computed: z.string() })),
  /** Nothing has changed since the latest edition. */
  isSame: z.boolean(),
});
export type EditionDraft = z.infer<typeof editionDraft>;

const changedPage = labelled.extend({
  from: count,
  to: count,
  /** `form`: the words are the same; kind, marks or places differ. */
  change: z.enum(['words', 'form']),
});

export const editionDifference = z.object({
  from: count,
  to: z.union([count, z.literal('work')]),
  pages: z.object({
    added: z.array(labelled.extend({ revision: count })),
    removed: z.array(labelled.extend({ revision: count })),
    changed: z.array(changedPage),
    same: count,
  }),
  quantities: z.object({
    added: z.array(quantity),
    removed: z.array(quantity),
    changed: z.array(z.object({ before: quantity, after: quantity })),
  }),
  /** Stages of the frequency plan, by their names. */
  plan: z.object({ added: z.array(z.string()), removed: z.array(z.string()), changed: z.array(z.string()) }),
});
export type EditionDifference = z.infer<typeof editionDifference>;

const number = z.coerce.number().int().positive();
const oneParams = manualParams.extend({ number });

export const listEditions = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/editions',
  summary: 'The editions of a manual, newest first, withdrawn ones among them',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery,
  reply: listOf(edition),
});

export const getEditionDraft = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/edition-draft',
  summary: 'What publishing now would make, and what speaks against it',
  action: 'publish-editions',
  params: manualParams,
  reply: editionDraft,
});

export const publishEdition = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/editions',
  summary: 'Publish the manual as it stands; 409 if the number was taken meanwhile',
  action: 'publish-editions',
  params: manualParams,
  body: z.object({
    /** The number it is to have, as the draft said. */
    number,
    name: z.string().trim().max(80).default(''),
    note: z.string().trim().max(2000).default(''),
  }),
  reply: edition,
  status: 201,
});

export const getEdition = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/editions/:number',
  summary: 'One edition with its pages',
  action: 'read-manuals',
  params: oneParams,
  reply: edition.extend({ pages: z.array(editionPage) }),
});

export const withdrawEdition = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/editions/:number/withdraw',
  summary: 'Withdraw an edition, with a reason; it stays in the list and can still be read',
  action: 'publish-editions',
  params: oneParams,
  body: z.object({ reason: z.string().trim().min(1, 'Say why it is withdrawn.').max(500) }),
  reply: edition,
});

export const getEditionDifference = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/editions/:number/difference',
  summary: 'What a later edition, or the present work, has otherwise than this one',
  action: 'read-manuals',
  params: oneParams,
  query: z.object({ to: z.union([z.literal('work'), number]).default('work') }),
  reply: editionDifference,
});

export const getEditionPage = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/editions/:number/pages/:pageId',
  summary: 'A page as an edition holds it',
  action: 'read-manuals',
  params: oneParams.extend({ pageId: id }),
  reply: page,
});

export const getEditionValues = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/editions/:number/quantities',
  summary: 'The quantities, the frequency plan and the channel tables as an edition holds them',
  action: 'read-manuals',
  params: oneParams,
  reply: z.object({ quantities: z.array(quantity), plan: frequencyPlan, tables: z.array(channelTable) }),
});
