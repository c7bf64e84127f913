import { z } from 'zod';
import { defineBlock, textAttribute, zone } from '#shared/document/define-block.ts';

/** A place in the text where a quantity stands in for the printed number. What was printed stays with it. */
export const liveValue = defineBlock({
  kind: 'liveValue',
  group: 'inline',
  content: null,
  attributes: z.object({
    quantity: z.string().min(1),
    printed: z.string().max(120),
    zone: zone.nullable().default(null),
  }),
  plainText: (node) => textAttribute(node, 'printed'),
});
