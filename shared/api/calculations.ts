import { z } from 'zod';
import { frequencyPlan } from '#shared/plan/plan.ts';
import { id, listOf, manualParams, ok, time } from './common.ts';
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

const column = z.object({ name: z.string(), unit: z.string() });

/** A table that formulas look into: each row is the key and then one number for each column, in the units of the heads. */
export const channelTable = z.object({
  id: z.string(),
  title: z.string(),
  source: z.string(),
  key: column,
  columns: z.array(column),
  rows: z.array(z.array(z.number())),
  pageId: id,
  /** Rows that could not be taken, with the reason. */
  left: z.array(z.string()),
});
export type ChannelTable = z.infer<typeof channelTable>;

export const listChannelTables = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/channel-tables',
  summary: 'The channel tables of a manual’s own pages, for formulas to look into; the published ones are built in',
  action: 'read-manuals',
  params: manualParams,
  reply: listOf(channelTable),
});

/** `number` counts the changes; 0 and an empty plan where nobody has drawn one yet. */
export const storedPlan = z.object({
  number: z.number().int().nonnegative(),
  plan: frequencyPlan,
  savedAt: time.nullable(),
  savedBy: z.string().nullable(),
});

export const getFrequencyPlan = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/frequency-plan',
  summary: 'The signal chain of the equipment: stages that feed each other',
  action: 'read-manuals',
  params: manualParams,
  reply: storedPlan,
});

export const saveFrequencyPlan = defineEndpoint({
  method: 'put',
  path: '/api/manuals/:manualId/frequency-plan',
  summary: 'Save the frequency plan; 409 with the present one if based on an older',
  action: 'edit-quantities',
  params: manualParams,
  body: z.object({ baseNumber: z.number().int().nonnegative(), plan: frequencyPlan }),
  reply: storedPlan,
});

const numberOfRelation = z.object({
  id: z.string(),
  text: z.string(),
  unit: z.string(),
  pageId: id,
  pageLabel: z.string(),
  label: z.string(),
  symbol: z.string().nullable(),
});

/** A relation that the printed numbers suggest. `expression` is over the numbers' symbols, or their ids where they have none. */
export const relationProposal = z.object({
  target: z.string(),
  expression: z.string(),
  filled: z.string(),
  says: z.string(),
  /** Powers of ten against chance. */
  score: z.number(),
  numbers: z.array(numberOfRelation),
  table: z.object({ holds: z.number().int(), rows: z.number().int(), failing: z.array(z.number().int()) }).nullable(),
});
export type RelationProposal = z.infer<typeof relationProposal>;

export const findRelations = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/relations',
  summary: 'Look for relations among the printed numbers of a manual; those accepted or dismissed before are left out',
  action: 'edit-quantities',
  params: manualParams,
  reply: z.object({ items: z.array(relationProposal), numbers: z.number().int() }),
});

export const judgeRelation = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/relations/verdicts',
  summary: 'Say that a proposed relation is accepted or dismissed: it is not proposed again',
  action: 'edit-quantities',
  params: manualParams,
  body: z.object({ relation: z.string().min(1).max(1000), verdict: z.enum(['accepted', 'dismissed']) }),
  reply: ok,
});
