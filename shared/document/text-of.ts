import type { DocNode, Zone } from './define-block.ts';
import { blockOf } from './registry.ts';

/** Plain text of a node in reading order; table rows are tab-separated lines. */
export function textOf(node: DocNode): string {
  const children = (node.content ?? []).map(textOf);
  return blockOf(node.type)?.plainText(node, children) ?? children.join('');
}

/** A stretch of text with its place on the scan; the zone is null where a person typed something new. */
export type PlacedText = { text: string; zone: Zone | null };

const zoneOf = (attrs: Record<string, unknown> | undefined): Zone | null =>
  (attrs?.['zone'] as Zone | null | undefined) ?? null;

/** Every stretch of text of the document in reading order, each with the zone it came from. */
export function placedTexts(node: DocNode): PlacedText[] {
  if (node.type === 'text') {
    const word = node.marks?.find(({ type }) => type === 'word');
    return [{ text: node.text ?? '', zone: zoneOf(word?.attrs) }];
  }
  if (node.type === 'liveValue') return [{ text: textOf(node), zone: zoneOf(node.attrs) }];
  const inner = (node.content ?? []).flatMap(placedTexts);
  return blockOf(node.type)?.group === 'inline' || inner.length === 0 ? inner : [...inner, { text: '\n', zone: null }];
}

/** How many doubts wait for a person: neighbouring text under one doubt counts once. */
export function countDoubts(node: DocNode): number {
  let count = 0;
  let open: string | null = null;
  for (const child of node.content ?? []) {
    if (child.type !== 'text') {
      count += countDoubts(child);
      open = null;
      continue;
    }
    const doubt = child.marks?.find(({ type }) => type === 'doubt');
    const key = doubt === undefined ? null : JSON.stringify(doubt.attrs ?? {});
    if (key !== null && key !== open) count += 1;
    open = key;
  }
  return count;
}

/** Every node of the document, parents before children. */
export function* allNodes(node: DocNode): Generator<DocNode> {
  yield node;
  for (const child of node.content ?? []) yield* allNodes(child);
}

/** The ids of the quantities that stand in the document as live values. */
export const quantitiesIn = (document: DocNode): string[] => [
  ...new Set(
    [...allNodes(document)].filter(({ type }) => type === 'liveValue').map(({ attrs }) => String(attrs?.['quantity'])),
  ),
];
