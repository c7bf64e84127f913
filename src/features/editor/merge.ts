import type { DocNode } from '#shared/document/define-block.ts';
import { inOrder, keyOfBlock } from '#src/blocks/compare/compare-blocks.ts';

export type Side = 'mine' | 'theirs';
/** One block of the page in three versions; undefined where it does not stand there. */
export type MergeItem = {
  key: string;
  base: DocNode | undefined;
  mine: DocNode | undefined;
  theirs: DocNode | undefined;
  decided: Side | null;
  changedBy: 'nobody' | Side | 'both';
};

/** Two edits of one page, block by block. Where only one side changed a block, that side's is taken; the rest is for a person. */
export function mergeDocuments(base: DocNode, mine: DocNode, theirs: DocNode): MergeItem[] {
  const [ofBase, ofMine, ofTheirs] = [base, mine, theirs].map(blocksByKey) as [Blocks, Blocks, Blocks];
  const keys = inOrder([...ofMine.keys()], [...ofTheirs.keys()]);
  const forgotten = [...ofBase.keys()].filter((key) => !keys.includes(key));
  return inOrder([...ofBase.keys()], keys)
    .filter((key) => !forgotten.includes(key))
    .map((key) => mergeItem(key, ofBase.get(key), { mine: ofMine.get(key), theirs: ofTheirs.get(key) }));
}

type Blocks = Map<string, DocNode>;
const blocksByKey = (document: DocNode): Blocks =>
  new Map((document.content ?? []).map((block, at) => [keyOfBlock(block, at), block]));
const written = (block: DocNode | undefined): string => (block === undefined ? '' : JSON.stringify(block));

function mergeItem(
  key: string,
  base: DocNode | undefined,
  { mine, theirs }: Record<Side, DocNode | undefined>,
): MergeItem {
  const common = { key, base, mine, theirs };
  if (written(mine) === written(theirs))
    return { ...common, decided: 'theirs', changedBy: written(mine) === written(base) ? 'nobody' : 'both' };
  if (written(mine) === written(base)) return { ...common, decided: 'theirs', changedBy: 'theirs' };
  if (written(theirs) === written(base)) return { ...common, decided: 'mine', changedBy: 'mine' };
  return { ...common, decided: null, changedBy: 'both' };
}

/** The page that comes of it, or null while something is undecided. */
export function mergedDocument(
  items: readonly MergeItem[],
  choices: Readonly<Record<string, Side>>,
  like: DocNode,
): DocNode | null {
  const content: DocNode[] = [];
  for (const item of items) {
    const side = choices[item.key] ?? item.decided;
    if (side === null) return null;
    const block = item[side];
    if (block !== undefined) content.push(block);
  }
  return { ...like, content: content.length === 0 ? [{ type: 'paragraph' }] : content };
}
