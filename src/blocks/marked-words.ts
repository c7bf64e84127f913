import type { DocNode } from '#shared/document/define-block.ts';
import { allNodes } from '#shared/document/text-of.ts';
import { parseQuery, type Term, tokensOf } from '#shared/search/query.ts';

/** Where to mark in a text node: offsets from and up to. */
export type Stretch = [from: number, to: number];

const wordPattern = /[\p{L}\p{N}µμ]+/gu;

/** Where the words of a query stand in the text nodes of a document. Words of a phrase are each marked where they are. */
export function stretchesOf(document: DocNode, query: string): Map<DocNode, Stretch[]> {
  const marked = new Map<DocNode, Stretch[]>();
  const terms = parseQuery(query);
  if (terms.length === 0) return marked;
  for (const node of allNodes(document)) {
    if (node.type !== 'text' || node.text === undefined) continue;
    const stretches = [...node.text.matchAll(wordPattern)].flatMap((match): Stretch[] =>
      isHit(match[0], terms) ? [[match.index, match.index + match[0].length]] : [],
    );
    if (stretches.length > 0) marked.set(node, stretches);
  }
  return marked;
}

const isHit = (word: string, terms: readonly Term[]): boolean =>
  tokensOf(word).some((token) =>
    terms.some(({ tokens, prefix }) => tokens.includes(token) || (prefix && token.startsWith(tokens.at(-1) ?? '\0'))),
  );
