import { type PointerEvent, type RefObject, useCallback, useRef, useState } from 'react';
import type { Zone } from '#shared/document/define-block.ts';
import { readZoneKey } from '#src/blocks/look.ts';
import { scrollToZone, useZoneLight, zoneUnder } from './zone-light.ts';

export type PageLink = {
  /** The element that the text scrolls in. */
  leaf: RefObject<HTMLDivElement | null>;
  active: string | null;
  setActive: (key: string | null) => void;
  /** What the scan is to show enlarged. */
  focusBox: Zone | null;
  showOnScan: (key: string) => void;
  /** Brings a zone into sight on both leaves; gives back its text, if it has one. */
  goTo: (key: string) => HTMLElement | null;
  showInText: (key: string) => HTMLElement | null;
  onTextHover: (event: PointerEvent) => void;
};

/** Ties the two leaves together: what is pointed at on one lights up on the other. */
export function usePageLink(first: Zone | null = null): PageLink {
  const leaf = useRef<HTMLDivElement>(null);
  const [active, setActive] = useState<string | null>(null);
  const [focusBox, setFocusBox] = useState<Zone | null>(first);
  useZoneLight(active);
  const showOnScan = useCallback((key: string) => {
    setActive(key);
    setFocusBox(readZoneKey(key));
  }, []);
  const showInText = useCallback((key: string) => {
    setActive(key);
    return scrollToZone(leaf.current, key);
  }, []);
  const goTo = useCallback(
    (key: string) => {
      showOnScan(key);
      return scrollToZone(leaf.current, key);
    },
    [showOnScan],
  );
  const onTextHover = useCallback(({ target }: PointerEvent) => {
    const key = zoneUnder(target);
    if (key !== null) setActive(key);
  }, []);
  return { leaf, active, setActive, focusBox, showOnScan, goTo, showInText, onTextHover };
}
