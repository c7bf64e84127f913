import { useEffect } from 'react';

/**
 * Lights up the text of a zone. Done by a style sheet of one rule instead of a class on the element: the editor watches its
 * elements and would take a changed class for something typed.
 */
export function useZoneLight(key: string | null): void {
  useEffect(() => {
    if (key === null || !/^[\d.,-]+$/.test(key)) return;
    const sheet = new CSSStyleSheet();
    sheet.replaceSync(
      `.page-text [data-zone="${key}"]:not(.b-table, tr) { background: var(--signal-wash); box-shadow: 0 0 0 2px var(--signal-wash); }`,
    );
    document.adoptedStyleSheets = [...document.adoptedStyleSheets, sheet];
    return () => {
      document.adoptedStyleSheets = document.adoptedStyleSheets.filter((each) => each !== sheet);
    };
  }, [key]);
}

/** The zone of what is under the pointer, or of the nearest thing around it that has one. */
export const zoneUnder = (target: EventTarget | null): string | null =>
  target instanceof Element ? (target.closest<HTMLElement>('[data-zone]')?.dataset['zone'] ?? null) : null;

/** Scrolls the text of a zone into the middle of its leaf. */
export function scrollToZone(leaf: Element | null, key: string): HTMLElement | null {
  const found = leaf?.querySelector<HTMLElement>(`[data-zone="${CSS.escape(key)}"]`) ?? null;
  if (found !== null) scrollInLeaf(found);
  return found;
}

/** Scrolls the leaf that an element stands in, and nothing around the leaf; where the leaf does not scroll, the screen. */
export function scrollInLeaf(element: Element): void {
  const behavior = window.matchMedia('(prefers-reduced-motion: reduce)').matches ? 'auto' : 'smooth';
  const leaf = element.closest('.leaf-scroll');
  if (leaf === null || leaf.scrollHeight <= leaf.clientHeight) {
    // At the top: on a phone the margin lies over the foot.
    element.scrollIntoView({ block: 'start', behavior });
    return;
  }
  const [inner, outer] = [element.getBoundingClientRect(), leaf.getBoundingClientRect()];
  leaf.scrollBy({ top: inner.top + inner.height / 2 - (outer.top + outer.height / 2), behavior });
}
