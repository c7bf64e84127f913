import { z } from 'zod';
import { quantityDefinition } from '#shared/calc/quantity.ts';
import { zone } from '#shared/document/define-block.ts';
import { id, listOf, listQuery, manualParams, ok, time } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

const place = z.object({ pageId: id.nullable().optional(), zone: zone.nullable().optional() });

export const quantity = quantityDefinition.and(place).and(z.object({ id }));
export type Quantity = z.infer<typeof quantity>;
export const quantityInput = quantityDefinition.and(place);
export type QuantityInput = z.infer<typeof quantityInput>;

/** What is sent replaces what is there, key by key; null takes a key away. The whole is checked as a new one would be. */
export const quantityChange = z.record(z.string(), z.unknown()).meta({
  description: 'Any of the properties of a quantity; null takes one away',
});

const one = manualParams.extend({ quantityId: id });
/** One value for each input that is away from home. */
export const inputs = z.record(z.string(), z.union([z.number(), z.string().max(120)]));

export const listQuantities = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/quantities',
  summary: 'The quantities of a manual: inputs, derived values and constants',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery.extend({ limit: z.coerce.number().int().min(1).max(20_000).default(20_000) }),
  reply: listOf(quantity),
});

export const createQuantity = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/quantities',
  summary: 'A new quantity',
  action: 'edit-quantities',
  params: manualParams,
  body: quantityInput,
  reply: quantity,
  status: 201,
});

export const updateQuantity = defineEndpoint({
  method: 'patch',
  path: '/api/manuals/:manualId/quantities/:quantityId',
  summary: 'Change a quantity',
  action: 'edit-quantities',
  params: one,
  body: quantityChange,
  reply: quantity,
});

export const deleteQuantity = defineEndpoint({
  method: 'delete',
  path: '/api/manuals/:manualId/quantities/:quantityId',
  summary: 'Delete a quantity; live values that showed it fall back to what was printed',
  action: 'edit-quantities',
  params: one,
  reply: ok,
});

const calcProblem = z.object({
  code: z.string(),
  message: z.string(),
  symbol: z.string(),
  start: z.number().optional(),
  end: z.number().optional(),
  cause: z.string().optional(),
});

export const evaluated = z.object({
  value: z.number().nullable(),
  unit: z.string(),
  text: z.string(),
  printed: z.string().optional(),
  low: z.number().optional(),
  high: z.number().optional(),
  rss: z.object({ low: z.number(), high: z.number() }).optional(),
  verdict: z
    .object({
      allowed: z.object({ low: z.number().optional(), high: z.number().optional() }),
      worstCase: z.enum(['pass', 'fail']),
      rss: z.enum(['pass', 'fail']),
    })
    .optional(),
  sensitivity: z.record(z.string(), z.object({ absolute: z.number(), ppm: z.number().nullable() })).optional(),
  dependsOn: z.array(z.string()),
  limitsBroken: z.boolean().optional(),
  problem: calcProblem.optional(),
});

export const evaluateManual = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/evaluate',
  summary: 'Every value at a setting; inputs left out stay at home; pin holds one value and solves for an input',
  action: 'evaluate',
  params: manualParams,
  body: z.object({
    inputs: inputs.default({}),
    pin: z
      .object({ symbol: z.string(), value: z.union([z.number(), z.string().max(120)]), solveFor: z.string() })
      .optional(),
  }),
  reply: z.object({
    values: z.record(z.string(), evaluated),
    setting: z.record(z.string(), z.number().nullable()),
    problems: z.array(calcProblem),
  }),
});

export const getProof = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/proof',
  summary: 'Whether every value comes out as printed at the home setting, and which do not',
  action: 'read-manuals',
  params: manualParams,
  reply: z.object({
    holds: z.boolean(),
    items: z.array(
      z.object({
        quantityId: id,
        symbol: z.string(),
        printed: z.string(),
        computed: z.string(),
        agrees: z.boolean(),
        pageId: id.nullable(),
      }),
    ),
  }),
});

export const setting = z.object({ id, name: z.string(), inputs, createdBy: z.string(), createdAt: time });
export type Setting = z.infer<typeof setting>;

export const listSettings = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/settings',
  summary: 'Saved settings of a manual',
  action: 'read-manuals',
  params: manualParams,
  query: listQuery,
  reply: listOf(setting),
});

export const saveSetting = defineEndpoint({
  method: 'post',
  path: '/api/manuals/:manualId/settings',
  summary: 'Save a setting under a name',
  action: 'save-settings',
  params: manualParams,
  body: z.object({ name: z.string().trim().min(1, 'Give the setting a name.').max(120), inputs }),
  reply: setting,
  status: 201,
});

export const deleteSetting = defineEndpoint({
  method: 'delete',
  path: '/api/manuals/:manualId/settings/:settingId',
  summary: 'Delete a saved setting',
  action: 'save-settings',
  params: manualParams.extend({ settingId: id }),
  reply: ok,
});
