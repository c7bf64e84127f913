import { z } from 'zod';
import { blockAttributes, defineBlock, inlineContent, joined } from '#shared/document/define-block.ts';

/** A running head or foot: kept, shown apart, and left out of the text flow. */
export const running = defineBlock({
  kind: 'running',
  group: 'block',
  content: inlineContent,
  attributes: z.object({ ...blockAttributes, place: z.enum(['head', 'foot']).default('head') }),
  plainText: joined,
});
