import { z } from 'zod';
import { blockAttributes, defineBlock, inlineContent, joined } from '#shared/document/define-block.ts';

export const heading = defineBlock({
  kind: 'heading',
  group: 'block',
  content: inlineContent,
  attributes: z.object({ ...blockAttributes, level: z.number().int().min(1).max(4).default(2) }),
  plainText: joined,
});
