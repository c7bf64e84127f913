import { z } from 'zod';
import { blockAttributes, defineBlock, inlineContent, joined } from '#shared/document/define-block.ts';

export const caption = defineBlock({
  kind: 'caption',
  group: 'block',
  content: inlineContent,
  attributes: z.object({ ...blockAttributes, of: z.enum(['figure', 'table']).default('figure') }),
  plainText: joined,
});
