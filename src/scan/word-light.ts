import { type RefObject, useCallback, useEffect } from 'react';
import type { FlatStretch, FlatText } from '#shared/document/flat-text.ts';
import { rangeOf, textSpots } from './text-places.ts';
import { scrollInLeaf } from './zone-light.ts';

type Given = {
  leaf: RefObject<HTMLElement | null>;
  flat: FlatText;
  /** Words that have a note. */
  resting: readonly (FlatStretch | null)[];
  /** Words whose note is looked at. */
  lit: FlatStretch | null;
};

/**
 * Marks words in the text without touching it: the browser paints ranges (`::highlight`), so neither the editor nor the
 * shared text knows of it. Gives back how to bring words into sight. A browser that cannot paint them shows the boxes
 * on the scan only.
 */
export function useWordLight({ leaf, flat, resting, lit }: Given): (stretch: FlatStretch) => void {
  const spotsNow = useCallback(() => {
    const root = leaf.current?.querySelector('.page-text') ?? null;
    return root === null ? null : textSpots(root, flat);
  }, [leaf, flat]);
  useEffect(() => {
    const element = leaf.current;
    if (element === null || typeof Highlight === 'undefined') return;
    let frame = 0;
    const paint = (): void => {
      const spots = spotsNow();
      // While the two differ the editor is ahead of the text that was looked through; what comes next paints again.
      if (spots === null) return;
      const ranges = (of: readonly (FlatStretch | null)[]): Range[] =>
        of.flatMap((stretch) => (stretch === null ? [] : (rangeOf(spots, stretch) ?? [])));
      CSS.highlights.set('note', new Highlight(...ranges(resting)));
      const looked = new Highlight(...ranges([lit]));
      looked.priority = 1;
      CSS.highlights.set('note-lit', looked);
    };
    const later = (): void => {
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(paint);
    };
    paint();
    const watch = new MutationObserver(later);
    watch.observe(element, { childList: true, characterData: true, subtree: true });
    return () => {
      watch.disconnect();
      cancelAnimationFrame(frame);
      CSS.highlights.delete('note');
      CSS.highlights.delete('note-lit');
    };
  }, [leaf, spotsNow, resting, lit]);
  return useCallback(
    (stretch) => {
      const range = rangeOf(spotsNow() ?? [], stretch);
      const element = range?.startContainer.parentElement;
      if (range != null && element != null && !isInSight(range, leaf.current)) scrollInLeaf(element);
    },
    [leaf, spotsNow],
  );
}

/** On a phone the margin lies over the lower part of the sheet (leaves.css). */
const coveredShare = (): number => (window.innerWidth < 768 ? 0.56 : 0);

function isInSight(range: Range, leaf: HTMLElement | null): boolean {
  const [inner, outer] = [range.getBoundingClientRect(), leaf?.getBoundingClientRect()];
  if (outer === undefined) return false;
  const foot = Math.min(outer.bottom, window.innerHeight * (1 - coveredShare()));
  return inner.top >= Math.max(outer.top, 0) && inner.bottom <= foot;
}
