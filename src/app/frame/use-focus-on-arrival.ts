import { type RefObject, useEffect, useRef } from 'react';
import { useLocation } from 'react-router';

/** On another screen the focus starts at its top, as it would on a page of its own. Not on the first one. */
export function useFocusOnArrival(): RefObject<HTMLElement | null> {
  const main = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const last = useRef(pathname);
  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    main.current?.focus({ preventScroll: true });
  }, [pathname]);
  return main;
}
