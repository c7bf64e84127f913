import { Editor } from '@tiptap/core';
import type { DocNode } from '#shared/document/define-block.ts';
import { readDocument } from '#shared/document/page-document.ts';
import { openText, stateOf } from '#shared/document/shared-text.ts';
import { editorExtensions } from './use-page-editor.ts';

/** The editor as the workspace has it, on a shared text that nobody else has open, without drawing live values. */
export function openEditor(content: DocNode): Editor {
  const page = readDocument(content);
  if (!page.ok) throw new Error(JSON.stringify(page.error));
  const text = openText(stateOf(page.value));
  return new Editor({ extensions: editorExtensions(text, { imageOf: () => '' }, false) });
}
