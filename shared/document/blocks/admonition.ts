import { z } from 'zod';
import { blockAttributes, defineBlock, textAttribute } from '#shared/document/define-block.ts';

export const admonitionKinds = ['warning', 'caution', 'note'] as const;

/** A hazard or hint that stands ahead of the step it guards. The printed word is kept, never mapped to another scheme. */
export const admonition = defineBlock({
  kind: 'admonition',
  group: 'block',
  content: { of: ['paragraph', 'step'], least: 1 },
  attributes: z.object({ ...blockAttributes, kind: z.enum(admonitionKinds).default('note') }),
  plainText: (node, children) => [textAttribute(node, 'kind').toUpperCase(), ...children].join('\n'),
});
