import { type Editor, Extension } from '@tiptap/core';
import { NodeSelection } from '@tiptap/pm/state';
import { nextMarker } from './step-marker.ts';

/** What Enter does in the kinds that our manuals have, and Enter on a live value. */
export const BlockKeys = Extension.create({
  name: 'blockKeys',
  priority: 1000,
  addKeyboardShortcuts() {
    return {
      Enter: ({ editor }) => openValue(editor) || nextStep(editor) || plainAfter(editor),
      Backspace: ({ editor }) => stepToParagraph(editor),
    };
  },
});

function openValue({ state, view }: Editor): boolean {
  const { selection } = state;
  if (!(selection instanceof NodeSelection) || selection.node.type.name !== 'liveValue') return false;
  const dom = view.nodeDOM(selection.from);
  if (dom instanceof HTMLElement) dom.querySelector('button')?.click();
  return true;
}

/** At the end of a step the next step begins, with the next marker; an empty one becomes a paragraph and ends the list. */
function nextStep(editor: Editor): boolean {
  const { $from, empty } = editor.state.selection;
  if (!empty || $from.parent.type.name !== 'step') return false;
  if ($from.parent.content.size === 0) return editor.commands.setNode('paragraph');
  const { marker, depth } = $from.parent.attrs as { marker: string; depth: number };
  return editor
    .chain()
    .splitBlock()
    .setNode('step', { marker: nextMarker(marker), depth })
    .run();
}

/** A heading, a caption or a running head is one line: behind its end goes a paragraph. */
function plainAfter(editor: Editor): boolean {
  const { $from, empty } = editor.state.selection;
  const isOneLine = ['heading', 'caption', 'running'].includes($from.parent.type.name);
  if (!empty || !isOneLine || $from.parentOffset < $from.parent.content.size) return false;
  return editor.chain().splitBlock().setNode('paragraph').run();
}

function stepToParagraph(editor: Editor): boolean {
  const { $from, empty } = editor.state.selection;
  if (!empty || $from.parentOffset > 0 || $from.parent.type.name !== 'step') return false;
  return editor.commands.setNode('paragraph');
}
