import { z } from 'zod';
import { id, listOf, listQuery, manualParams, ok, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

const optionalText = z.string().trim().max(200).nullable();

/** How the manual's own habits bear on its reading. */
const habits = {
  /** What people correct settles and raises doubts on the manual's other pages. */
  learns: z.boolean(),
  /** Units as this manual writes them, beyond those that every manual may use. */
  ownUnits: z.array(z.string().trim().min(1).max(12)).max(40),
};

export const manual = z.object({
  id,
  title: z.string(),
  equipment: optionalText,
  maker: optionalText,
  documentNumber: optionalText,
  editionDate: optionalText,
  createdAt: time,
  createdBy: z.string(),
  deletedAt: time.nullable(),
  ...habits,
  reading: z.enum(['running', 'paused']),
  pageCounts: z.object({
    all: z.number().int(),
    waiting: z.number().int(),
    reading: z.number().int(),
    read: z.number().int(),
    failed: z.number().int(),
    corrected: z.number().int(),
    proofed: z.number().int(),
  }),
  doubtCount: z.number().int(),
  quantityCount: z.number().int(),
});
export type Manual = z.infer<typeof manual>;

const facts = {
  equipment: optionalText.optional(),
  maker: optionalText.optional(),
  documentNumber: optionalText.optional(),
  editionDate: optionalText.optional(),
};
export const manualInput = z.object({ title: z.string().trim().min(1, 'A manual needs a title.').max(200), ...facts });
export type ManualInput = z.infer<typeof manualInput>;

export const listManuals = defineEndpoint({
  method: 'get',
  path: '/api/manuals',
  summary: 'The manuals; with bin=true those in the bin',
  action: 'read-manuals',
  query: listQuery.extend({ bin: z.stringbool().default(false) }),
  reply: listOf(manual),
});

export const createManual = defineEndpoint({
  method: 'post',
  path: '/api/manuals',
  summary: 'A new manual',
  action: 'add-manuals',
  body: manualInput,
  reply: manual,
  status: 201,
});

export const getManual = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId',
  summary: 'One manual',
  action: 'read-manuals',
  params: manualParams,
  reply: manual,
});

export const updateManual = defineEndpoint({
  method: 'patch',
  path: '/api/manuals/:manualId',
  summary: 'Change what is recorded about a manual',
  action: 'add-manuals',
  params: manualParams,
  body: manualInput.extend(habits).partial(),
  reply: manual,
});

export const deleteManual = defineEndpoint({
  method: 'delete',
  path: '/api/manuals/:manualId',
  summary: 'Put a manual in the bin; nothing is lost',
  action: 'add-manuals',
  params: manualParams,
  reply: ok,
});

export const restoreManual = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/restore',
  summary: 'Take a manual back out of the bin',
  action: 'add-manuals',
  params: manualParams,
  reply: manual,
});

export const steerReading = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/reading-queue',
  summary: 'Pause, resume or cancel the reading of a manual, or try its failed pages again',
  action: 'run-recognition',
  params: manualParams,
  body: z.object({ do: z.enum(['pause', 'resume', 'cancel', 'retry']) }),
  reply: z.object({ pages: z.number().int() }),
});
