import { z } from 'zod';
import { documentJson } from '#shared/api/pages.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { readStored, writeStored } from '#src/lib/use-stored.ts';

const keyOf = (pageId: string): string => `benchleaf.draft.${pageId}`;
const draftShape = z.object({ baseRevision: z.number().int(), keptAt: z.string(), document: documentJson });

export type Draft = { baseRevision: number; keptAt: string; document: DocNode };

/** The text that somebody left unsaved on this page, in this browser. Null where there is none, or it cannot be read any more. */
export function readDraft(pageId: string): Draft | null {
  const stored = readStored(keyOf(pageId));
  if (stored === null || stored === '') return null;
  const shape = draftShape.safeParse(parsed(stored));
  const document = shape.success ? readDocument(shape.data.document) : null;
  return shape.success && document?.ok === true ? { ...shape.data, document: document.value } : null;
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

export const keepDraft = (pageId: string, draft: Draft): void => writeStored(keyOf(pageId), JSON.stringify(draft));

export function dropDraft(pageId: string): void {
  try {
    window.localStorage.removeItem(keyOf(pageId));
  } catch {
    // Without storage there was no draft either.
  }
}
