import type { DocNode } from '#shared/document/define-block.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { textOf } from '#shared/document/text-of.ts';
import { editDistance, levelled } from './text-score.ts';

/** A block of a generated page, as its truth tells it. */
export type TrueBlock = { type: string; text: string };

/** Blocks found as what they are, of all there are: one tally a kind of block. */
export type Tally = Record<string, { right: number; all: number }>;

/** Texts that differ in this share of their letters or less are the same block. */
const alikeShare = 0.2;
const isAlike = (truth: string, read: string): boolean => {
  const [a, b] = [levelled(truth), levelled(read)];
  return editDistance(a, b) <= Math.max(a.length, b.length) * alikeShare;
};

/** For each kind of block: how a node of the document shows that it is this one. */
const shows: Record<string, (node: DocNode, truth: TrueBlock) => boolean> = {
  heading: (node, { text }) => node.type === 'heading' && isAlike(text, textIn(node)),
  step: (node, { text }) => {
    const [marker = '', ...rest] = text.split(' ');
    return node.type === 'step' && node.attrs?.['marker'] === marker && isAlike(rest.join(' '), contentOf(node));
  },
  para: (node, { text }) => node.type === 'paragraph' && isAlike(text, textIn(node)),
  ...Object.fromEntries(
    ['warning', 'caution', 'note'].map((kind) => [
      kind,
      (node: DocNode, { text }: TrueBlock) =>
        node.type === 'admonition' && node.attrs?.['kind'] === kind && isAlike(text, contentOf(node)),
    ]),
  ),
  caption: (node, { text }) => node.type === 'caption' && isAlike(text, textIn(node)),
  header: (node, { text }) =>
    node.type === 'running' && node.attrs?.['place'] === 'head' && isAlike(text, textIn(node)),
  footer: (node, { text }) =>
    node.type === 'running' && node.attrs?.['place'] === 'foot' && isAlike(text, textIn(node)),
};

const textIn = (node: DocNode): string => textOf({ type: 'doc', content: [node] });
const contentOf = ({ content = [] }: DocNode): string =>
  content.map((child) => child.text ?? contentOf(child)).join('');

/** Adds a page's blocks to the tallies; a caption counts as attached when its figure or table is its neighbour. */
export function tallyStructure(tally: Tally, blocks: readonly TrueBlock[], document: PageDocument): void {
  const left = [...document.content];
  for (const truth of blocks) {
    const test = shows[truth.type];
    if (test === undefined) continue;
    const at = left.findIndex((node) => test(node, truth));
    count(tally, truth.type, at >= 0);
    const found = at < 0 ? undefined : left.splice(at, 1)[0];
    if (truth.type === 'caption') count(tally, 'caption attached', found !== undefined && isAttached(found, document));
  }
  for (const node of document.content) if (node.type === 'table') tallyColumns(tally, node);
}

function isAttached(caption: DocNode, { content }: PageDocument): boolean {
  const at = content.indexOf(caption);
  return [content[at - 1], content[at + 1]].some((node) => node?.type === 'figure' || node?.type === 'table');
}

/** Every column of a generated table has a meaning that its heading tells; one left as `other` was not typed. */
function tallyColumns(tally: Tally, { attrs }: DocNode): void {
  for (const { meaning } of (attrs?.['columns'] ?? []) as { meaning: string }[])
    count(tally, 'columns typed', meaning !== 'other');
}

function count(tally: Tally, name: string, isRight: boolean): void {
  const { right, all } = tally[name] ?? { right: 0, all: 0 };
  tally[name] = { right: right + (isRight ? 1 : 0), all: all + 1 };
}

export const tallyText = (tally: Tally): string =>
  Object.entries(tally)
    .map(([name, { right, all }]) => `${name} ${right}/${all}`)
    .join(', ');
