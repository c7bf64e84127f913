import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import type { PageSummary } from '#shared/api/pages.ts';
import { pagesOfManual } from '#src/api/pages.ts';
import { presenceIn } from '#src/api/presence.ts';
import { useCan } from '#src/api/session.ts';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { PageNumbers } from './page-numbers.tsx';
import { PageTile } from './page-tile.tsx';

type Wanted = 'all' | 'doubts' | 'unread';

const wantedPages: Record<Wanted, (page: PageSummary) => boolean> = {
  all: () => true,
  doubts: ({ doubtCount }) => doubtCount > 0,
  unread: ({ state }) => state === 'waiting' || state === 'reading' || state === 'failed',
};

type Props = { manualId: string; /** The way to give the first files, for those who may. */ pickFiles?: ReactNode };

/** The pages in order, as they would lie on a table. */
export function PageStrip({ manualId, pickFiles }: Props) {
  const { data: pages, error, isPending, refetch } = useQuery(pagesOfManual(manualId));
  if (isPending) return <Pending what="Laying out the pages …" />;
  if (pages === undefined)
    return <Failure what="The pages could not be fetched" error={error} onRetry={() => void refetch()} />;
  if (pages.length === 0) {
    return (
      <Empty title="This manual has no pages yet" action={pickFiles}>
        {pickFiles === undefined || pickFiles === null
          ? 'An archivist adds the scans. Their pages appear here as they are read.'
          : 'Choose the scans, or drop them anywhere on this screen: PDF, TIFF (also of many pages), PNG, JPEG or WebP.'}
      </Empty>
    );
  }
  return <Strip manualId={manualId} pages={pages} />;
}

function Strip({ manualId, pages }: { manualId: string; pages: readonly PageSummary[] }) {
  const mayEdit = useCan('edit-pages');
  const [wanted, setWanted] = useState<Wanted>('all');
  const [isLabelling, setLabelling] = useState(false);
  const { data: presence = [] } = useQuery(presenceIn(manualId));
  const shown = pages.filter(wantedPages[wanted]);
  const count = (which: Wanted): number => pages.filter(wantedPages[which]).length;
  return (
    <>
      <div className="screen-only mb-4 flex flex-wrap items-center justify-between gap-3">
        <ToggleGroup
          label="Which pages"
          value={wanted}
          onValueChange={setWanted}
          choices={[
            { value: 'all', label: `All ${pages.length}` },
            { value: 'doubts', label: `With doubts ${count('doubts')}` },
            { value: 'unread', label: `Not read ${count('unread')}` },
          ]}
        />
        {mayEdit ? (
          <Button look="quiet" aria-pressed={isLabelling} onClick={() => setLabelling(!isLabelling)}>
            {isLabelling ? 'Labels are right' : 'Correct the labels'}
          </Button>
        ) : null}
      </div>
      {isLabelling ? <PageNumbers manualId={manualId} /> : null}
      {shown.length === 0 ? (
        <Empty
          title="No page is left in this choice"
          action={<Button onClick={() => setWanted('all')}>Show all {counted(pages.length, 'page')}</Button>}
        />
      ) : (
        <ol aria-label="Pages" className="grid grid-cols-[repeat(auto-fill,minmax(148px,1fr))] gap-x-5 gap-y-8">
          {shown.map((page) => (
            <PageTile
              key={page.id}
              manualId={manualId}
              page={page}
              people={presence.find(({ pageId }) => pageId === page.id)?.people.map(({ name }) => name) ?? []}
              isLabelling={isLabelling}
            />
          ))}
        </ol>
      )}
    </>
  );
}
