import { keyOfBlock } from './block-key.ts';
import type { DocNode } from './define-block.ts';
import { textOf } from './text-of.ts';

type Revision = { number: number; document: DocNode };
export type BlockAuthor<R> = { block: string; kind: string; words: string; revision: R };

/**
 * Who wrote each block of a page: the last revision in which its text changed, or in which it came. The revisions are
 * given oldest first. A block without a lasting name is told by its words.
 */
export function blockAuthors<R extends Revision>(revisions: Iterable<R>): BlockAuthor<R>[] {
  let known = new Map<string, { words: string; revision: R }>();
  let last: DocNode[] = [];
  for (const revision of revisions) {
    last = revision.document.content ?? [];
    const now: typeof known = new Map();
    for (const block of last) {
      const words = textOf(block);
      const before = known.get(nameOf(block, words));
      now.set(nameOf(block, words), before?.words === words ? before : { words, revision });
    }
    known = now;
  }
  return last.flatMap((block, at) => {
    const words = textOf(block);
    const found = known.get(nameOf(block, words));
    return found === undefined
      ? []
      : [{ block: keyOfBlock(block, at), kind: block.type, words, revision: found.revision }];
  });
}

const nameOf = ({ attrs }: DocNode, words: string): string =>
  typeof attrs?.['id'] === 'string' ? `id ${attrs['id']}` : `words ${words}`;
