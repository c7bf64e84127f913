import { z } from 'zod';
import { blockAttributes, defineBlock, inlineContent, joined } from '#shared/document/define-block.ts';

export const paragraph = defineBlock({
  kind: 'paragraph',
  group: 'block',
  content: inlineContent,
  attributes: z.object(blockAttributes),
  plainText: joined,
});
