import type { Editor } from '@tiptap/core';
import { useCallback } from 'react';
import { scrollInLeaf } from '#src/scan/zone-light.ts';
import { type Doubt, doubtAt, doubtBeside, doubtsOf } from './doubts.ts';

export type DoubtWalk = {
  goBeside: (step: 1 | -1) => void;
  goTo: (doubt: Doubt) => void;
  settle: () => void;
  take: (doubt: Doubt, text: string) => void;
  /** Settles several at once, as they stand or as another text; one undo brings them all back. */
  settleAll: (doubts: readonly Doubt[], text: string | null) => void;
};

/** From doubt to doubt. The scan follows, enlarged on the word. */
export function useDoubtWalk(editor: Editor, showOnScan: (key: string) => void): DoubtWalk {
  const goTo = useCallback(
    ({ from, to, zone }: Doubt) => {
      editor.chain().focus(undefined, { scrollIntoView: false }).setTextSelection({ from, to }).run();
      const { node } = editor.view.domAtPos(from + 1);
      const element = node instanceof Element ? node : node.parentElement;
      if (element !== null) scrollInLeaf(element);
      if (zone !== null) showOnScan(zone);
    },
    [editor, showOnScan],
  );
  const goBeside = useCallback(
    (step: 1 | -1) => {
      const { from, to } = editor.state.selection;
      const doubt = doubtBeside(doubtsOf(editor.state.doc), step === 1 ? from : to, step);
      if (doubt !== undefined) goTo(doubt);
    },
    [editor, goTo],
  );
  const settle = useCallback(() => {
    const here = doubtAt(doubtsOf(editor.state.doc), editor.state.selection.from);
    const mark = editor.schema.marks['doubt'];
    if (here === undefined || mark === undefined) return;
    editor
      .chain()
      .command(({ tr }) => tr.removeMark(here.from, here.to, mark) !== null)
      .run();
    const next = doubtBeside(doubtsOf(editor.state.doc), here.from, 1);
    if (next !== undefined) goTo(next);
  }, [editor, goTo]);
  const take = useCallback(
    ({ from, to }: Doubt, text: string) => {
      // The word keeps its place on the scan; that the text is another settles the doubt.
      editor
        .chain()
        .focus()
        .command(({ tr }) => {
          tr.insertText(text, from, to);
          return true;
        })
        .run();
    },
    [editor],
  );
  const settleAll = useSettleAll(editor);
  return { goBeside, goTo, settle, take, settleAll };
}

function useSettleAll(editor: Editor): DoubtWalk['settleAll'] {
  return useCallback(
    (doubts, text) => {
      const mark = editor.schema.marks['doubt'];
      if (mark === undefined) return;
      editor
        .chain()
        .command(({ tr }) => {
          // From the end, so that a longer or shorter text does not move those still to be settled.
          for (const { from, to } of [...doubts].reverse()) {
            if (text === null) tr.removeMark(from, to, mark);
            else tr.insertText(text, from, to);
          }
          return true;
        })
        .run();
    },
    [editor],
  );
}
