import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { SearchHit } from '#shared/api/search.ts';
import { searchFor, type Wanted } from '#src/api/search.ts';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Hit } from './hit.tsx';

type Group = { manualId: string; title: string; hits: SearchHit[] };

/** Hits under the manual they stand in; the manual of the best hit first. */
export function byManual(hits: readonly SearchHit[]): Group[] {
  const groups = new Map<string, Group>();
  for (const hit of hits) {
    const group = groups.get(hit.manualId) ?? { manualId: hit.manualId, title: hit.manualTitle, hits: [] };
    group.hits.push(hit);
    groups.set(hit.manualId, group);
  }
  return [...groups.values()];
}

export function Results({ wanted, onWiden }: { wanted: Wanted; onWiden: (() => void) | undefined }) {
  const { data, error, isPending, refetch, hasNextPage, fetchNextPage, isFetchingNextPage, isPlaceholderData } =
    useInfiniteQuery(searchFor(wanted));
  if (isPending) return <Pending what="Looking …" />;
  if (data === undefined) return <Failure what="The search failed" error={error} onRetry={() => void refetch()} />;
  const hits = data.pages.flatMap(({ items }) => items);
  if (hits.length === 0) return <NothingFound wanted={wanted} onWiden={onWiden} />;
  const groups = byManual(hits);
  const isClose = data.pages[0]?.close === true;
  return (
    <div aria-busy={isPlaceholderData || undefined} className={isPlaceholderData ? 'opacity-60' : undefined}>
      <p role="status" className="mb-3 text-pencil">
        {hasNextPage ? 'The first ' : ''}
        {counted(hits.length, 'place')} in {counted(groups.length, 'manual')}
      </p>
      {isClose ? (
        <Notice kind="doubt" title="Near matches only" className="mb-4">
          Nothing reads exactly “{wanted.q}”. These come close: letters that the reading may have mistaken for one
          another.
        </Notice>
      ) : null}
      {groups.map((group) => (
        <section key={group.manualId} aria-label={group.title} className="mb-8">
          <h2 className="border-b border-ink pb-1 font-serif text-lead font-semibold">
            <Link to={`/manuals/${group.manualId}`} className="decoration-signal underline-offset-4 hover:underline">
              {group.title}
            </Link>
          </h2>
          <ol className="divide-y divide-rule border-b border-rule">
            {group.hits.map((hit) => (
              <Hit
                key={`${hit.kind} ${hit.pageId} ${hit.label} ${hit.snippet} ${hit.boxes.join(' ')}`}
                hit={hit}
                q={wanted.q}
              />
            ))}
          </ol>
        </section>
      ))}
      {hasNextPage ? (
        <Button busy={isFetchingNextPage && 'Looking further …'} onClick={() => void fetchNextPage()}>
          Look further
        </Button>
      ) : null}
    </div>
  );
}

const NothingFound = ({ wanted, onWiden }: { wanted: Wanted; onWiden: (() => void) | undefined }) => (
  <Empty
    title={`“${wanted.q}” was not found`}
    action={onWiden === undefined ? undefined : <Button onClick={onWiden}>Look everywhere</Button>}
  >
    Try fewer words, or part of a part number. A quantity is found in any unit: 455 kc finds 0.455 MHz.
  </Empty>
);
