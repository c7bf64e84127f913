import { z } from 'zod';
import { referenceKinds } from '#shared/document/cross-references.ts';
import { zone } from '#shared/document/define-block.ts';
import { id, listOf, manualParams } from './common.ts';
import { defineEndpoint } from './endpoint.ts';

const place = z.object({ pageId: id, pageLabel: z.string(), zone: zone.nullable() });
export const target = place.extend({ kind: z.enum(referenceKinds), name: z.string() });
export const openReference = place.extend({
  /** What is pointed at: "figure 9-9". */
  text: z.string(),
  /** With the words around it. */
  words: z.string(),
});

export const listTargets = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/targets',
  summary: 'What texts of the manual can point at: numbered headings and paragraphs, captions, pages and listed parts',
  action: 'read-manuals',
  params: manualParams,
  reply: listOf(target),
});

export const listOpenReferences = defineEndpoint({
  method: 'get',
  path: '/api/manuals/:manualId/open-references',
  summary: 'What the texts of the manual point at that the manual does not have',
  action: 'read-manuals',
  params: manualParams,
  reply: listOf(openReference),
});
