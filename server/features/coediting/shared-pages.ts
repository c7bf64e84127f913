import { type Document, Hocuspocus } from '@hocuspocus/server';
import { AppError } from '#shared/kit/app-error.ts';
import { pagesWithPendingEdits, saveTogether } from '#server/features/revisions/index.ts';
import type { Tools } from '#server/http/tools.ts';
import { type Seat, hooksOf, takeInStored } from './hooks.ts';
import { type Presence, createPresence } from './presence.ts';
import { whenQuiet } from './quiet.ts';

export type SharedPages = { hocuspocus: Hocuspocus<Seat>; presence: Presence; stop: () => void };

/**
 * The pages that people have open to correct, each as one text that all of them write (Yjs). A text is named by the id of
 * its page. What is written becomes a revision when the page falls quiet, when the last writer leaves, or on demand.
 */
export function createSharedPages(tools: Tools): SharedPages {
  const presence = createPresence(tools.live);
  const quiet = whenQuiet(tools.config.limits.quietMs, (pageId) => saveByItself(tools, pageId));
  const hocuspocus = new Hocuspocus<Seat>({ quiet: true, ...hooksOf(tools, { presence, quiet }) });
  const unsubscribe = tools.live.subscribe((event) => {
    if (event.type !== 'page') return;
    // A revision may have come another way than through the shared text.
    const text = hocuspocus.documents.get(event.page.id);
    if (text !== undefined) followRevision(tools, { hocuspocus, text });
  });
  // What was being written when the server last stopped.
  for (const pageId of pagesWithPendingEdits(tools.db)) quiet.stir(pageId);
  return {
    hocuspocus,
    presence,
    stop() {
      unsubscribe();
      quiet.stop();
      hocuspocus.closeConnections();
    },
  };
}

type Open = { hocuspocus: Hocuspocus<Seat>; text: Document };

/** Whoever has a page open whose manual was put in the bin meanwhile is sent away; what they typed is kept. */
function followRevision(tools: Tools, { hocuspocus, text }: Open): void {
  try {
    takeInStored(tools, text);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    hocuspocus.closeConnections(text.name);
  }
}

/** What cannot be kept as a page stays with the shared text, and is tried again when somebody next leaves it. */
function saveByItself(tools: Tools, pageId: string): void {
  try {
    saveTogether(tools, null, { pageId, note: '' });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    tools.log.warn({ pageId, reason: error.message }, 'no revision was made of a shared text');
  }
}
