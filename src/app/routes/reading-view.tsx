import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link, useParams, useSearchParams } from 'react-router';
import type { Page } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { onePage } from '#src/api/pages.ts';
import { useCan } from '#src/api/session.ts';
import { LiveValues } from '#src/blocks/live-value/live-values.tsx';
import { CommentsPanel } from '#src/features/comments/comments-panel.tsx';
import { useNotesOfPage } from '#src/features/comments/use-notes-of-page.ts';
import { HistoryButton } from '#src/features/history/history-button.tsx';
import { ReadPage } from '#src/features/reader/read-page.tsx';
import { SettingBar } from '#src/features/reader/setting-bar.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { PageTitle } from '#src/scan/page-title.tsx';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';

export function Component() {
  const { pageId = '' } = useParams();
  const { data: page, error, isPending, refetch } = useQuery(onePage(pageId));
  useTitle(page === undefined ? undefined : `Page ${page.label}`);
  if (page !== undefined) return <Reading key={page.id} page={page} />;
  return (
    <Screen>
      {isPending ? (
        <Pending what="Fetching the page …" />
      ) : (
        <Failure what="The page could not be fetched" error={error} onRetry={() => void refetch()} />
      )}
    </Screen>
  );
}

function Reading({ page }: { page: Page }) {
  const [asked] = useSearchParams();
  const boxes = asked.get('boxes') ?? '';
  const hits = useMemo(() => zonesFrom(boxes), [boxes]);
  const mayEdit = useCan('edit-pages');
  const mayComment = useCan('comment');
  const notes = useNotesOfPage(page.id);
  const hasMargin = mayComment || notes.length > 0;
  return (
    <LiveValues manualId={page.manualId}>
      <div className="desk">
        <PageTitle page={page} doubts={page.doubtCount} addressOf={(id) => `/pages/${id}/read`}>
          {mayEdit ? (
            <Button asChild>
              <Link to={`/pages/${page.id}`}>Correct this page</Link>
            </Button>
          ) : null}
          <HistoryButton pageId={page.id} label={page.label} mayRestore={false} />
          <Button onClick={() => window.print()}>Print</Button>
        </PageTitle>
        <SettingBar manualId={page.manualId} startsOpen />
        <ReadPage
          {...{ page, hits, notes }}
          query={asked.get('q') ?? ''}
          mayMark={mayComment}
          comments={
            hasMargin
              ? (places) => <CommentsPanel page={page} notes={places} asked={asked.get('comment')} hasButton />
              : null
          }
        />
      </div>
    </LiveValues>
  );
}

/** Boxes in an address: `10,20,30,40;50,60,70,80`, or the same as JSON. Anything else is no box. */
function zonesFrom(text: string): Zone[] {
  const numbers = (text.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
  return Array.from({ length: Math.floor(numbers.length / 4) }, (_, at) => numbers.slice(at * 4, at * 4 + 4) as Zone);
}
