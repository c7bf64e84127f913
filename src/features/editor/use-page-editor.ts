import { Gapcursor, UndoRedo } from '@tiptap/extensions';
import { type Editor, useEditor } from '@tiptap/react';
import type { DocNode } from '#shared/document/define-block.ts';
import { liveValueNodeView } from '#src/blocks/live-value/edit.tsx';
import { editorSchema } from '#src/blocks/editor-schema.ts';
import type { LookContext } from '#src/blocks/look.ts';
import { BlockKeys } from './block-keys.ts';
import { ColumnHeads } from './column-heads.ts';
import { PlainSpaces } from './plain-spaces.ts';
import { SettleDoubts } from './settle-doubts.ts';
import { StampBlocks } from './stamp-blocks.ts';

/** Everything the editor is made of; the schema comes from the registry of blocks. */
export const editorExtensions = (context: LookContext, withViews = true) => [
  ...editorSchema(context, withViews ? { liveValue: liveValueNodeView } : {}),
  UndoRedo,
  Gapcursor,
  PlainSpaces,
  SettleDoubts,
  StampBlocks,
  ColumnHeads,
  BlockKeys,
];

type Given = { document: DocNode; context: LookContext; label: string };

export function usePageEditor({ document, context, label }: Given): Editor {
  return useEditor(
    {
      extensions: editorExtensions(context),
      content: document,
      editorProps: {
        attributes: {
          'aria-label': label,
          'aria-multiline': 'true',
          role: 'textbox',
          class: 'page-text',
          spellcheck: 'false',
        },
      },
    },
    // A new page is a new component; the document is only what the editor begins with.
    [],
  );
}
