import { Extension } from '@tiptap/core';
import { isChangeOrigin } from '@tiptap/extension-collaboration';
import { Plugin } from '@tiptap/pm/state';

/** Marks are for text alone (the page document's rule): a break or a live value inside a bold stretch stays plain. */
export const PlainAtoms = Extension.create({
  name: 'plainAtoms',
  addProseMirrorPlugins: () => [
    new Plugin({
      appendTransaction(transactions, _before, { doc, tr }) {
        if (!transactions.some((each) => each.docChanged && !isChangeOrigin(each))) return null;
        doc.descendants((node, position) => {
          if (node.isInline && !node.isText) for (const mark of node.marks) tr.removeNodeMark(position, mark);
        });
        return tr.docChanged ? tr : null;
      },
    }),
  ],
});
