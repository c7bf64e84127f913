import { z } from 'zod';
import { defineBlock, zone } from '#shared/document/define-block.ts';

const attributes = z.object({
  zone: zone.nullable().default(null),
  colspan: z.number().int().min(1).max(40).default(1),
  rowspan: z.number().int().min(1).max(500).default(1),
  colwidth: z.array(z.number()).nullable().default(null),
});
const content = { of: ['paragraph'], least: 1 } as const;
const cellText = (_node: unknown, children: string[]): string => children.join(' ').replace(/\s+/g, ' ').trim();

export const tableCell = defineBlock({
  kind: 'tableCell',
  group: 'cell',
  content,
  tableRole: 'cell',
  attributes,
  plainText: cellText,
});

export const tableHeader = defineBlock({
  kind: 'tableHeader',
  group: 'cell',
  content,
  tableRole: 'header_cell',
  attributes,
  plainText: cellText,
});
