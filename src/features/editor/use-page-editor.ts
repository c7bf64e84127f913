import { Collaboration } from '@tiptap/extension-collaboration';
import { CollaborationCaret } from '@tiptap/extension-collaboration-caret';
import { Gapcursor } from '@tiptap/extensions';
import { type Editor, useEditor } from '@tiptap/react';
import type { Doc } from 'yjs';
import { textField } from '#shared/document/shared-text.ts';
import { liveValueNodeView } from '#src/blocks/live-value/edit.tsx';
import { editorSchema } from '#src/blocks/editor-schema.ts';
import type { LookContext } from '#src/blocks/look.ts';
import { BlockKeys } from './block-keys.ts';
import { ColumnHeads } from './column-heads.ts';
import { drawCaret, markSelection } from './others-carets.ts';
import { PasteRows } from './paste-rows.ts';
import { PlainAtoms } from './plain-atoms.ts';
import { PlainSpaces } from './plain-spaces.ts';
import { SettleDoubts } from './settle-doubts.ts';
import { StampBlocks } from './stamp-blocks.ts';
import type { SharedText } from './use-shared-text.ts';

/** Everything the editor is made of; the schema comes from the registry of blocks, the text from its shared copy. */
export const editorExtensions = (text: Doc, context: LookContext, withViews = true) => [
  ...editorSchema(context, withViews ? { liveValue: liveValueNodeView } : {}),
  Collaboration.configure({ document: text, field: textField }),
  Gapcursor,
  PlainSpaces,
  PlainAtoms,
  PasteRows,
  SettleDoubts,
  StampBlocks,
  ColumnHeads,
  BlockKeys,
];

type Given = { shared: Pick<SharedText, 'text' | 'provider'>; context: LookContext; label: string; name: string };

export function usePageEditor({ shared: { text, provider }, context, label, name }: Given): Editor {
  return useEditor(
    {
      extensions: [
        ...editorExtensions(text, context),
        CollaborationCaret.configure({
          provider,
          user: { name },
          render: drawCaret,
          selectionRender: markSelection,
        }),
      ],
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
    // A new page is a new component, with a shared text of its own.
    [],
  );
}
