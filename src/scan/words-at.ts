import type { DocNode } from '#shared/document/define-block.ts';
import { allNodes, textOf } from '#shared/document/text-of.ts';
import { zoneKey } from '#src/blocks/look.ts';

const longest = 40;

/** The beginning of the text that came from a zone, for naming it. */
export function wordsAt(document: DocNode | null, key: string): string {
  if (document === null) return '';
  for (const node of allNodes(document)) {
    const zones = [node.attrs?.['zone'], ...(node.marks ?? []).map(({ attrs }) => attrs?.['zone'])];
    if (!zones.some((zone) => Array.isArray(zone) && zoneKey(zone as never) === key)) continue;
    const text = textOf(node).replace(/\s+/g, ' ').trim();
    return text.length > longest ? `${text.slice(0, longest)} …` : text === '' ? node.type : text;
  }
  return '';
}
