import { keyOfBlock } from '#shared/document/block-key.ts';
import type { DocNode } from '#shared/document/define-block.ts';
import { cellTexts } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import { type ComparedRow, compareTables } from './compare-tables.ts';
import { type Piece, compareWords } from './compare-words.ts';

/** One block as it was and as it is; an unchanged one has a single piece of kind same. */
export type ComparedBlock = {
  key: string;
  kind: string;
  change: 'same' | 'changed' | 'gone' | 'new' | 'form';
  lines: Piece[][];
  /** Where it is a table in both. */
  rows?: ComparedRow[];
};

/** Text of a block as lines: a table by its rows, anything else as it reads. */
export const linesOf = (block: DocNode): string[] =>
  block.type === 'table' ? (block.content ?? []).map((row) => cellTexts(row).join(' | ')) : [textOf(block)];

/** Blocks of two documents side by side, word by word; blocks are told by their names. */
export function compareDocuments(older: DocNode, newer: DocNode): ComparedBlock[] {
  const before = new Map((older.content ?? []).map((block, at) => [keyOfBlock(block, at), block]));
  const after = new Map((newer.content ?? []).map((block, at) => [keyOfBlock(block, at), block]));
  const keys = inOrder([...before.keys()], [...after.keys()]);
  return keys.map((key) => compareBlock(key, before.get(key), after.get(key)));
}

/** The newer order, with what is gone put behind what it stood behind. */
export function inOrder(older: readonly string[], newer: readonly string[]): string[] {
  const order = [...newer];
  older.forEach((key, at) => {
    if (order.includes(key)) return;
    const behind = older.slice(0, at).findLast((each) => order.includes(each));
    order.splice(behind === undefined ? 0 : order.indexOf(behind) + 1, 0, key);
  });
  return order;
}

export function compareBlock(key: string, older: DocNode | undefined, newer: DocNode | undefined): ComparedBlock {
  const block = newer ?? older;
  const kind = block?.type ?? '';
  if (older === undefined || newer === undefined) {
    const piece = older === undefined ? 'new' : 'gone';
    return {
      key,
      kind,
      change: piece,
      lines: block === undefined ? [] : linesOf(block).map((text) => [{ kind: piece, text }]),
    };
  }
  const lines = compareLines(linesOf(older), linesOf(newer));
  const isChanged = lines.some((pieces) => pieces.some((piece) => piece.kind !== 'same'));
  const change = isChanged ? 'changed' : JSON.stringify(older) === JSON.stringify(newer) ? 'same' : 'form';
  const areTables = older.type === 'table' && newer.type === 'table';
  return { key, kind, change, lines, ...(areTables ? { rows: compareTables(older, newer) } : {}) };
}

/** Rows of a table that are alike stand beside each other; the others are compared word by word. */
function compareLines(older: readonly string[], newer: readonly string[]): Piece[][] {
  if (older.length === 1 && newer.length === 1) return [compareWords(older[0] ?? '', newer[0] ?? '')];
  const lines: Piece[][] = [];
  let at = 0;
  for (const line of newer) {
    const same = older.indexOf(line, at);
    if (same >= 0) {
      for (; at < same; at += 1) lines.push([{ kind: 'gone', text: older[at] ?? '' }]);
      lines.push([{ kind: 'same', text: line }]);
      at += 1;
      continue;
    }
    const before = older[at];
    if (before === undefined || newer.includes(before)) lines.push([{ kind: 'new', text: line }]);
    else {
      lines.push(compareWords(before, line));
      at += 1;
    }
  }
  return [...lines, ...older.slice(at).map((text): Piece[] => [{ kind: 'gone', text }])];
}
