import { Extension } from '@tiptap/core';
import type { Node } from '@tiptap/pm/model';
import { Plugin, PluginKey } from '@tiptap/pm/state';
import { Decoration, DecorationSet } from '@tiptap/pm/view';
import type { TableColumn } from '#shared/document/blocks/table.ts';
import { meaningAttribute } from '#src/blocks/meaning-attribute.ts';

const key = new PluginKey<DecorationSet>('columnHeads');

/** Shows beneath each printed column heading what the column means. */
export const ColumnHeads = Extension.create({
  name: 'columnHeads',
  addProseMirrorPlugins: () => [
    new Plugin<DecorationSet>({
      key,
      state: {
        init: (_config, { doc }) => headsOf(doc),
        apply: ({ docChanged, doc }, heads) => (docChanged ? headsOf(doc) : heads),
      },
      props: { decorations: (state) => key.getState(state) },
    }),
  ],
});

function headsOf(doc: Node): DecorationSet {
  const heads: Decoration[] = [];
  doc.forEach((block, position) => {
    if (block.type.name !== 'table') return;
    const columns = block.attrs['columns'] as readonly TableColumn[];
    block.forEach((row, rowOffset) => {
      row.forEach((cell, cellOffset, index) => {
        if (cell.type.name !== 'tableHeader') return;
        const from = position + 1 + rowOffset + 1 + cellOffset;
        heads.push(Decoration.node(from, from + cell.nodeSize, meaningAttribute(columns[index]?.meaning)));
      });
    });
  });
  return DecorationSet.create(doc, heads);
}
