import { z } from 'zod';
import { defineBlock } from '#shared/document/define-block.ts';

export const doc = defineBlock({
  kind: 'doc',
  group: 'top',
  content: { of: ['block'], least: 1 },
  attributes: z.object({ version: z.number().int().positive().default(1) }),
  plainText: (_node, children) => children.filter((text) => text !== '').join('\n'),
});
