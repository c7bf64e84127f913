import type { DocNode, Zone } from '#shared/document/define-block.ts';
import { allNodes } from '#shared/document/text-of.ts';
import { zoneKey } from '#src/blocks/look.ts';

export type BoxKind = 'word' | 'block' | 'doubt' | 'live' | 'hit' | 'note';
export type ScanBox = { key: string; box: Zone; kind: BoxKind };

/** The zones of a page as boxes for its scan: its blocks, its words, its doubts and its live values. */
export function boxesOf(document: DocNode): ScanBox[] {
  const boxes = new Map<string, ScanBox>();
  const put = (zone: unknown, kind: BoxKind): void => {
    if (!Array.isArray(zone)) return;
    const [box, key] = [zone as Zone, zoneKey(zone as Zone)];
    // A block of one word has the word's zone: the word is the one to light up.
    if (!boxes.has(key) || kind !== 'block') boxes.set(key, { key, box, kind });
  };
  for (const { type, attrs, marks } of allNodes(document)) {
    if (type === 'liveValue') put(attrs?.['zone'], 'live');
    else if (type !== 'text') put(attrs?.['zone'], 'block');
    const word = marks?.find((mark) => mark.type === 'word');
    if (word !== undefined)
      put(word.attrs?.['zone'], marks?.some((mark) => mark.type === 'doubt') === true ? 'doubt' : 'word');
  }
  return [...boxes.values()];
}

/** The smallest box under a point: the word rather than its block. */
export function boxAt(boxes: readonly ScanBox[], { x, y }: { x: number; y: number }): ScanBox | null {
  let best: ScanBox | null = null;
  for (const each of boxes) {
    const [left, top, width, height] = each.box;
    const isInside = x >= left && x <= left + width && y >= top && y <= top + height;
    if (isInside && (best === null || areaOf(each) < areaOf(best))) best = each;
  }
  return best;
}

const areaOf = ({ box: [, , width, height] }: ScanBox): number => width * height;
