import { z } from 'zod';
import { blockAttributes, defineBlock } from '#shared/document/define-block.ts';

export const tableKinds = ['parts', 'channel', 'table'] as const;
export const columnMeanings = [
  'refDes',
  'partNumber',
  'description',
  'quantity',
  'value',
  'tolerance',
  'rating',
  'maker',
  'remarks',
  'item',
  'channel',
  'frequency',
  'other',
] as const;
export type ColumnMeaning = (typeof columnMeanings)[number];
export const tableColumn = z.object({ heading: z.string(), meaning: z.enum(columnMeanings) });
export type TableColumn = z.infer<typeof tableColumn>;

/** A parts list, a channel table or any other table; what each column means is said once, here. */
export const table = defineBlock({
  kind: 'table',
  group: 'block',
  content: { of: ['row'], least: 1 },
  tableRole: 'table',
  attributes: z.object({
    ...blockAttributes,
    kind: z.enum(tableKinds).default('table'),
    columns: z.array(tableColumn).max(40).default([]),
  }),
  plainText: (_node, children) => children.join('\n'),
});
