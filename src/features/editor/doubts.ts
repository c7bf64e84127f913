import type { Node } from '@tiptap/pm/model';
import { type DoubtMark, doubtReasons } from '#shared/document/marks.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { zoneKey } from '#src/blocks/look.ts';

/** One stretch of text in doubt, with its place in the document and on the scan. */
export type Doubt = {
  from: number;
  to: number;
  text: string;
  reason: string;
  proposals: readonly string[];
  zone: string | null;
};

/** The doubts of a document in reading order. Neighbouring text under one and the same doubt is one, as it is counted. */
export function doubtsOf(doc: Node): Doubt[] {
  const doubts: Doubt[] = [];
  doc.descendants((parent, position) => {
    if (!parent.isTextblock) return true;
    let open: { key: string; doubt: Doubt } | null = null;
    parent.forEach((child, offset) => {
      const mark = child.marks.find(({ type }) => type.name === 'doubt');
      const from = position + 1 + offset;
      if (!child.isText || mark === undefined) {
        open = null;
        return;
      }
      const key = JSON.stringify(mark.attrs);
      if (open?.key === key) {
        open.doubt.to = from + child.nodeSize;
        open.doubt.text += child.text ?? '';
        return;
      }
      const { reason, proposals } = mark.attrs as DoubtMark;
      const zone = child.marks.find(({ type }) => type.name === 'word')?.attrs['zone'] as Zone | undefined;
      const doubt: Doubt = {
        from,
        to: from + child.nodeSize,
        text: child.text ?? '',
        reason: doubtReasons[reason],
        proposals,
        zone: zone === undefined ? null : zoneKey(zone),
      };
      open = { key, doubt };
      doubts.push(doubt);
    });
    return false;
  });
  return doubts;
}

export const doubtAt = (doubts: readonly Doubt[], position: number): Doubt | undefined =>
  doubts.find(({ from, to }) => position >= from && position <= to);

/** The doubt after or before a place, round the end of the page. */
export function doubtBeside(doubts: readonly Doubt[], position: number, step: 1 | -1): Doubt | undefined {
  if (step === 1) return doubts.find(({ from }) => from > position) ?? doubts[0];
  return doubts.findLast(({ to }) => to < position) ?? doubts.at(-1);
}

/** The doubts that read alike for the same reason, the given one among them: what is right for one is likely right for all. */
export const doubtsLike = (doubts: readonly Doubt[], { text, reason }: Doubt): Doubt[] =>
  doubts.filter((each) => each.text === text && each.reason === reason);
