import { useState } from 'react';
import type { Page, PageState } from '#shared/api/pages.ts';
import { imageVersion } from '#src/api/pages.ts';

const drawing: readonly PageState[] = ['waiting', 'reading', 'failed'];

/** The version of the page's picture, kept while only its text changes, so that saving does not fetch the picture anew. */
export function useScanVersion(page: Page): string {
  const stage = `${page.id} ${page.hasImage} ${drawing.includes(page.state)}`;
  const [held, setHeld] = useState({ stage, version: imageVersion(page) });
  if (held.stage === stage) return held.version;
  const next = { stage, version: imageVersion(page) };
  setHeld(next);
  return next.version;
}
