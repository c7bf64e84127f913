import { type Result, fail, succeed } from '#shared/kit/result.ts';
import { keyOfBlock } from './block-key.ts';
import type { DocNode } from './define-block.ts';

/** Row and cell of a table, counted from 0 as they lie in the document. */
type CellPlace = readonly [row: number, cell: number];
export type Part = {
  block: string;
  /** One cell alone: where it lies in the older table and where in the present one. */
  cell?: { from: CellPlace; to: CellPlace } | undefined;
};

/** The page with one block, or one cell, as it was on an older state of it; everything else stays. */
export function restorePart<D extends DocNode>(now: D, older: DocNode, { block, cell }: Part): Result<D, string> {
  const was = blockNamed(older, block);
  if (was === undefined) return fail('The older revision has no such block.');
  if (cell === undefined) return succeed({ ...now, content: withBlock(now, older, block) });
  const table = blockNamed(now, block);
  const back = cellAt(was, cell.from);
  const present = cellAt(table, cell.to);
  if (table === undefined || back === undefined || present === undefined)
    return fail('The table has no such cell any more. Restore the whole table, or write the cell by hand.');
  // Spans belong to the table as it is laid out now; the words are what comes back.
  const { content: _content, ...shell } = present;
  const filled: DocNode = back.content === undefined ? shell : { ...shell, content: back.content };
  const blocks = now.content ?? [];
  return succeed({ ...now, content: replaced(blocks, blocks.indexOf(table), withCell(table, cell.to, filled)) });
}

const blockNamed = ({ content = [] }: DocNode, key: string): DocNode | undefined =>
  content.find((each, at) => keyOfBlock(each, at) === key);

const cellAt = (table: DocNode | undefined, [row, cell]: CellPlace): DocNode | undefined =>
  table?.content?.[row]?.content?.[cell];

const replaced = <T>(list: readonly T[], at: number, item: T): T[] =>
  list.map((each, index) => (index === at ? item : each));

const withCell = (table: DocNode, [row, column]: CellPlace, cell: DocNode): DocNode => ({
  ...table,
  content: (table.content ?? []).map((each, index) =>
    index === row ? { ...each, content: replaced(each.content ?? [], column, cell) } : each,
  ),
});

/** In its place where it still stands; else behind what it stood behind. */
function withBlock(now: DocNode, older: DocNode, key: string): DocNode[] {
  const was = blockNamed(older, key);
  const blocks = now.content ?? [];
  if (was === undefined) return blocks;
  const keys = blocks.map(keyOfBlock);
  const at = keys.indexOf(key);
  if (at >= 0) return replaced(blocks, at, was);
  const olderKeys = (older.content ?? []).map(keyOfBlock);
  const behind = olderKeys.slice(0, olderKeys.indexOf(key)).findLast((each) => keys.includes(each));
  const place = behind === undefined ? 0 : keys.indexOf(behind) + 1;
  return [...blocks.slice(0, place), was, ...blocks.slice(place)];
}
