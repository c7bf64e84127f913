import { z } from 'zod';
import { defineBlock, zone } from '#shared/document/define-block.ts';

export const rowRoles = ['head', 'section', 'body'] as const;

/** Heading rows name the columns, section rows name a group of parts; only body rows are parts. */
export const tableRow = defineBlock({
  kind: 'tableRow',
  group: 'row',
  content: { of: ['cell'], least: 1 },
  tableRole: 'row',
  attributes: z.object({ zone: zone.nullable().default(null), role: z.enum(rowRoles).default('body') }),
  plainText: (_node, children) => children.join('\t'),
});
