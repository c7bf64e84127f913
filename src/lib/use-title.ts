import { useEffect } from 'react';

const site = document.title;

/** The name of the screen in the browser's tab and history. */
export function useTitle(title: string | undefined): void {
  useEffect(() => {
    document.title = title === undefined ? site : `${title} · ${site}`;
  }, [title]);
}
