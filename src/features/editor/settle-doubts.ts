import { Extension } from '@tiptap/core';
import { isChangeOrigin } from '@tiptap/extension-collaboration';
import type { Node } from '@tiptap/pm/model';
import { Plugin, type Transaction } from '@tiptap/pm/state';
import { doubtsOf } from './doubts.ts';

/** Set on a transaction that brings text from elsewhere: doubts in it are still doubts. */
export const keepDoubts = 'keepDoubts';

type Range = { from: number; to: number };

/** Whoever changes a doubtful word has settled it. Undoing the change brings the doubt back with it. */
export const SettleDoubts = Extension.create({
  name: 'settleDoubts',
  addProseMirrorPlugins: () => [
    new Plugin({
      appendTransaction(transactions, _before, { doc, tr, schema }) {
        const edits = transactions.filter((each) => each.docChanged && isEdit(each));
        const mark = schema.marks['doubt'];
        if (edits.length === 0 || mark === undefined) return null;
        const changed = edits.flatMap((edit) => changedRanges(edit, transactions));
        if (changed.length === 0) return null;
        for (const doubt of doubtsOf(doc))
          if (changed.some((range) => touches(doc, doubt, range))) tr.removeMark(doubt.from, doubt.to, mark);
        return tr.docChanged ? tr : null;
      },
    }),
  ],
});

/** What others typed they have settled themselves, and so it is with what is undone. */
const isEdit = (transaction: Transaction): boolean =>
  transaction.getMeta(keepDoubts) === undefined && !isChangeOrigin(transaction);

/** Where text was put in or taken out, in positions after all the transactions. Marks and attributes change no text. */
function changedRanges(edit: Transaction, all: readonly Transaction[]): Range[] {
  const later = all.slice(all.indexOf(edit) + 1);
  return edit.steps.flatMap((_step, index) => {
    const rest = edit.mapping.slice(index + 1);
    const through = (position: number, side: 1 | -1): number =>
      later.reduce((at, { mapping }) => mapping.map(at, side), rest.map(position, side));
    const ranges: Range[] = [];
    edit.mapping.maps[index]?.forEach((...[, , from, to]) => {
      ranges.push({ from: through(from, -1), to: through(to, 1) });
    });
    return ranges;
  });
}

/** A change inside the doubt, or one grown onto its edge without a space between. */
function touches(doc: Node, doubt: Range, changed: Range): boolean {
  if (changed.from < doubt.to && changed.to > doubt.from) return true;
  if (changed.from === changed.to) return changed.from >= doubt.from && changed.from <= doubt.to;
  const joins = (from: number, to: number): boolean => /^\S$/.test(doc.textBetween(from, to, '\n', '\uFFFC'));
  if (changed.from === doubt.to) return joins(doubt.to, doubt.to + 1);
  return changed.to === doubt.from && joins(doubt.from - 1, doubt.from);
}
