import type { QueryClient } from '@tanstack/react-query';
import { type LiveEvent, liveEvent } from '#shared/api/events.ts';
import type { PageSummary } from '#shared/api/pages.ts';
import type { PagePresence } from '#shared/api/presence.ts';
import { commentKeys } from './comment-keys.ts';
import { editionKeys } from './edition-keys.ts';
import { manualKeys } from './manuals.ts';
import { pageKeys } from './page-keys.ts';
import { partKeys } from './part-keys.ts';
import { presenceKey, withPresence } from './presence.ts';
import { quantityKeys } from './quantity-keys.ts';
import { sourceKeys } from './source-keys.ts';

const address = '/api/events';
/** After the browser has given up (the server answered with an error), we try again after this. */
const reopenMs = 5000;
/** Counts of a manual change with every page that is read; they are fetched at most this often. */
const countsEveryMs = 1000;

export type QueueState = { waiting: number; active: number };
export const queueKey = ['queue'] as const;

/** Opens the one stream of events and keeps the caches of this client true to it. Returns how to close it. */
export function followEvents(client: QueryClient): () => void {
  let source: EventSource | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let wasLost = false;
  const later = throttledCounts(client);
  const open = (): void => {
    source = new EventSource(address);
    source.onopen = () => {
      // What happened while nobody listened is not told again.
      if (wasLost) void refetchAll(client);
      wasLost = false;
    };
    source.onmessage = ({ data }: MessageEvent<string>) => {
      const event = readEvent(data);
      if (event !== null) applyEvent(client, event, later);
    };
    source.onerror = () => {
      wasLost = true;
      if (source?.readyState === EventSource.CLOSED) timer = setTimeout(open, reopenMs);
    };
  };
  open();
  return () => {
    clearTimeout(timer);
    source?.close();
  };
}

export function readEvent(data: string): LiveEvent | null {
  try {
    const read = liveEvent.safeParse(JSON.parse(data));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}

type Counts = (manualId: string) => void;

/** Shows at once what the event tells, and marks the rest to be fetched. */
export function applyEvent(client: QueryClient, event: LiveEvent, countsChanged: Counts): void {
  switch (event.type) {
    case 'page':
      pageChanged(client, event.manualId, event.page);
      countsChanged(event.manualId);
      return;
    case 'pages':
      void client.invalidateQueries({ queryKey: pageKeys.ofManual(event.manualId) });
      void client.invalidateQueries({ queryKey: sourceKeys.ofManual(event.manualId) });
      countsChanged(event.manualId);
      return;
    case 'source':
      void client.invalidateQueries({ queryKey: sourceKeys.ofManual(event.manualId) });
      return;
    case 'quantities':
      void client.invalidateQueries({ queryKey: quantityKeys.ofManual(event.manualId) });
      void client.invalidateQueries({ queryKey: editionKeys.againstWork(event.manualId) });
      countsChanged(event.manualId);
      return;
    case 'editions':
      void client.invalidateQueries({ queryKey: editionKeys.ofManual(event.manualId) });
      return;
    case 'comments':
      void client.invalidateQueries({ queryKey: commentKeys.ofPage(event.pageId) });
      void client.invalidateQueries({ queryKey: commentKeys.openIn(event.manualId) });
      return;
    case 'presence':
      client.setQueryData(presenceKey(event.manualId), (known: PagePresence[] | undefined) =>
        withPresence(known, event),
      );
      return;
    case 'queue':
      client.setQueryData(queueKey, { waiting: event.waiting, active: event.active } satisfies QueueState);
  }
}

function pageChanged(client: QueryClient, manualId: string, summary: PageSummary): void {
  const key = pageKeys.ofManual(manualId);
  const before = client.getQueryData<PageSummary[]>(key)?.find(({ id }) => id === summary.id);
  if (before === undefined) void client.invalidateQueries({ queryKey: key });
  client.setQueryData(key, (pages: PageSummary[] | undefined) =>
    pages?.map((page) => (page.id === summary.id ? summary : page)),
  );
  if (before?.revision !== summary.revision || before.state !== summary.state) {
    void client.invalidateQueries({ queryKey: pageKeys.one(summary.id) });
    void client.invalidateQueries({ queryKey: partKeys.ofManual(manualId) });
    void client.invalidateQueries({ queryKey: editionKeys.againstWork(manualId) });
  }
  // The words of an edition stay, but their places follow the picture.
  if (before !== undefined && before.imageVersion !== summary.imageVersion)
    void client.invalidateQueries({ queryKey: editionKeys.ofManual(manualId) });
}

function throttledCounts(client: QueryClient): Counts {
  const waiting = new Set<string>();
  return (manualId) => {
    if (waiting.has(manualId)) return;
    waiting.add(manualId);
    setTimeout(() => {
      waiting.delete(manualId);
      void client.invalidateQueries({ queryKey: manualKeys.one(manualId) });
      void client.invalidateQueries({ queryKey: manualKeys.lists });
    }, countsEveryMs);
  };
}

const refetchAll = (client: QueryClient): Promise<void> => client.invalidateQueries();
