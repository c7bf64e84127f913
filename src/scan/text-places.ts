import type { FlatStretch, FlatText } from '#shared/document/flat-text.ts';

/** A piece of the flat text as it stands on the screen: within a text node, or a live value as a whole. */
type Spot = FlatStretch & ({ node: Text; offset: number } | { node: HTMLElement; offset: null });

/** Drawn with the text, but no words of the page: markers of steps, the word WARNING, names at others' carets. */
const notText = '.b-marker, .b-word, .b-no-figure, .other-caret';

function* shownIn(node: Node): Generator<Text | HTMLElement> {
  if (node instanceof Text) {
    if (node.length > 0) yield node;
  } else if (node instanceof HTMLElement && !node.matches(notText)) {
    if (node.matches('.live')) yield node;
    else for (const child of node.childNodes) yield* shownIn(child);
  }
}

/** Lays the flat text of a page beside its elements, in the editor or in the reading view. Null while the two differ. */
export function textSpots(root: Element, { pieces }: FlatText): Spot[] | null {
  const shown = shownIn(root);
  const spots: Spot[] = [];
  let node: Text | HTMLElement | undefined;
  let offset = 0;
  const take = (): void => {
    [node, offset] = [shown.next().value as Text | HTMLElement | undefined, 0];
  };
  take();
  for (const { from, to, isLive } of pieces) {
    if (isLive) {
      if (!(node instanceof HTMLElement)) return null;
      spots.push({ node, offset: null, from, to });
      take();
      continue;
    }
    for (let at = from; at < to;) {
      if (!(node instanceof Text)) return null;
      const length = Math.min(to - at, node.length - offset);
      spots.push({ node, offset, from: at, to: at + length });
      [at, offset] = [at + length, offset + length];
      if (offset === node.length) take();
    }
  }
  return node === undefined ? spots : null;
}

/** A stretch of the flat text as a range of the document on the screen. */
export function rangeOf(spots: readonly Spot[], { from, to }: FlatStretch): Range | null {
  const touched = spots.filter((spot) => spot.from < to && spot.to > from);
  const [first, last] = [touched[0], touched.at(-1)];
  if (first === undefined || last === undefined) return null;
  const range = document.createRange();
  if (first.offset === null) range.setStartBefore(first.node);
  else range.setStart(first.node, first.offset + Math.max(0, from - first.from));
  if (last.offset === null) range.setEndAfter(last.node);
  else range.setEnd(last.node, last.offset + Math.min(last.to, to) - last.from);
  return range;
}

/** The stretch of the flat text that a range covers; empty for a caret. */
export function stretchOfRange(spots: readonly Spot[], range: StaticRange): FlatStretch {
  const from = offsetOf(spots, { node: range.startContainer, offset: range.startOffset, isEnd: false });
  const to = range.collapsed
    ? from
    : offsetOf(spots, { node: range.endContainer, offset: range.endOffset, isEnd: true });
  return { from, to: Math.max(from, to) };
}

type Point = { node: Node; offset: number; isEnd: boolean };

function offsetOf(spots: readonly Spot[], { node, offset, isEnd }: Point): number {
  const point = document.createRange();
  point.setStart(node, offset);
  const spot = spots.find((each) => {
    const end = each.offset === null ? each.node.childNodes.length : each.offset + each.to - each.from;
    return point.comparePoint(each.node, end) >= 0;
  });
  if (spot === undefined) return spots.at(-1)?.to ?? 0;
  if (spot.node === node && spot.offset !== null) return Math.max(spot.from, spot.from + offset - spot.offset);
  return isEnd && spot.node.contains(node) ? spot.to : spot.from;
}
