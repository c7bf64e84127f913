import { z } from 'zod';
import { defineBlock } from '#shared/document/define-block.ts';

export const text = defineBlock({
  kind: 'text',
  group: 'inline',
  content: null,
  attributes: z.object({}),
  plainText: (node) => node.text ?? '',
});

export const hardBreak = defineBlock({
  kind: 'hardBreak',
  group: 'inline',
  content: null,
  attributes: z.object({}),
  plainText: () => '\n',
});
