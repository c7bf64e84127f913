import { Extension } from '@tiptap/core';
import { isChangeOrigin } from '@tiptap/extension-collaboration';
import { Plugin } from '@tiptap/pm/state';

/** Long enough that two people who add blocks to one page do not hit upon the same name. */
const newId = (): string => `p${crypto.randomUUID().slice(0, 8)}`;

/** Every block of the page keeps a name of its own, so that it can be followed from revision to revision. */
export const StampBlocks = Extension.create({
  name: 'stampBlocks',
  addProseMirrorPlugins: () => [
    new Plugin({
      appendTransaction(transactions, _before, { doc, tr }) {
        // What others added carries a name from their window.
        if (!transactions.some((each) => each.docChanged && !isChangeOrigin(each))) return null;
        const seen = new Set<string>();
        doc.forEach((block, position) => {
          const id = block.attrs['id'] as string | null;
          if (id !== null && !seen.has(id)) seen.add(id);
          else tr.setNodeAttribute(position, 'id', newId());
        });
        return tr.docChanged ? tr : null;
      },
    }),
  ],
});
