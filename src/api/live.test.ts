import { QueryClient } from '@tanstack/react-query';
import { describe, expect, it, vi } from 'vitest';
import type { PageSummary } from '#shared/api/pages.ts';
import { commentKeys } from './comment-keys.ts';
import { applyEvent, queueKey, readEvent } from './live.ts';
import { pageKeys } from './page-keys.ts';

const page: PageSummary = {
  id: 'p1',
  position: 1,
  label: '1-1',
  state: 'reading',
  confidence: null,
  doubtCount: 0,
  revision: 0,
  problem: null,
  half: 'whole',
  warnings: [],
  imageVersion: 'drawn',
};

describe('a live event', () => {
  it('changes the page in the list at once', () => {
    const client = new QueryClient();
    client.setQueryData(pageKeys.ofManual('m'), [page, { ...page, id: 'p2' }]);
    const counts = vi.fn();
    applyEvent(
      client,
      { type: 'page', manualId: 'm', page: { ...page, state: 'read', revision: 1, confidence: 93 } },
      counts,
    );
    expect(client.getQueryData<PageSummary[]>(pageKeys.ofManual('m'))?.map(({ state }) => state)).toEqual([
      'read',
      'reading',
    ]);
    expect(counts).toHaveBeenCalledWith('m');
  });

  it('marks the opened page as stale when it has another revision, and only then', () => {
    const client = new QueryClient();
    client.setQueryData(pageKeys.ofManual('m'), [page]);
    client.setQueryData(pageKeys.one('p1'), {});
    applyEvent(client, { type: 'page', manualId: 'm', page: { ...page, doubtCount: 2 } }, vi.fn());
    expect(client.getQueryState(pageKeys.one('p1'))?.isInvalidated).toBe(false);
    applyEvent(client, { type: 'page', manualId: 'm', page: { ...page, revision: 1 } }, vi.fn());
    expect(client.getQueryState(pageKeys.one('p1'))?.isInvalidated).toBe(true);
  });

  it('marks the comments of its page and of its manual as stale', () => {
    const client = new QueryClient();
    const keys = [commentKeys.ofPage('p1'), commentKeys.ofPage('p2'), commentKeys.openIn('m')];
    for (const key of keys) client.setQueryData(key, []);
    applyEvent(client, { type: 'comments', manualId: 'm', pageId: 'p1' }, vi.fn());
    expect(keys.map((key) => client.getQueryState(key)?.isInvalidated)).toEqual([true, false, true]);
  });

  it('keeps how long the queue is', () => {
    const client = new QueryClient();
    applyEvent(client, { type: 'queue', waiting: 3, active: 1 }, vi.fn());
    expect(client.getQueryData(queueKey)).toEqual({ waiting: 3, active: 1 });
  });

  it('is passed over when it is not understood', () => {
    expect(readEvent('{"type":"unheard-of"}')).toBeNull();
    expect(readEvent('not json')).toBeNull();
  });
});
