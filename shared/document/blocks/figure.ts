import { z } from 'zod';
import { blockAttributes, defineBlock, textAttribute } from '#shared/document/define-block.ts';

/** A drawing or photograph: the crop of the page image at its zone, with words for those who cannot see it. */
export const figure = defineBlock({
  kind: 'figure',
  group: 'block',
  content: null,
  attributes: z.object({ ...blockAttributes, description: z.string().max(500).default('') }),
  plainText: (node) => textAttribute(node, 'description'),
});
