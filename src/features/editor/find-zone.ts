import type { Editor } from '@tiptap/core';
import type { Node } from '@tiptap/pm/model';
import type { Zone } from '#shared/document/define-block.ts';
import { zoneKey } from '#src/blocks/look.ts';

const keyOf = (zone: unknown): string | null => (Array.isArray(zone) ? zoneKey(zone as Zone) : null);
const wordKey = (node: Node | null | undefined): string | null =>
  keyOf(node?.marks.find(({ type }) => type.name === 'word')?.attrs['zone']);

/** The zone of the word at the caret; else of the block, row or cell around it. */
export function zoneAtCaret({ state: { selection } }: Editor): string | null {
  const { $from } = selection;
  const word = wordKey($from.nodeAfter) ?? wordKey($from.nodeBefore) ?? keyOf($from.nodeAfter?.attrs['zone']);
  if (word !== null) return word;
  for (let depth = $from.depth; depth > 0; depth -= 1) {
    const around = keyOf($from.node(depth).attrs['zone']);
    if (around !== null) return around;
  }
  return null;
}

/** Where the text of a zone begins in the document; undefined where nothing of it is left. */
export function positionOfZone(doc: Node, key: string): number | undefined {
  let found: number | undefined;
  doc.descendants((node, position) => {
    if (found !== undefined) return false;
    if (wordKey(node) === key) found = position;
    else if (keyOf(node.attrs['zone']) === key) found = node.isInline ? position : position + 1;
    return found === undefined;
  });
  return found;
}
