import { z } from 'zod';
import { blockAttributes, defineBlock, inlineContent, textAttribute } from '#shared/document/define-block.ts';

/** A numbered or lettered step of a procedure, with the marker as printed: "a.", "(3)", "12.". */
export const step = defineBlock({
  kind: 'step',
  group: 'block',
  content: inlineContent,
  attributes: z.object({
    ...blockAttributes,
    marker: z.string().max(12).default(''),
    depth: z.number().int().min(0).max(4).default(0),
  }),
  plainText: (node, children) => `${textAttribute(node, 'marker')} ${children.join('')}`.trim(),
});
