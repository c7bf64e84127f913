import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo } from 'react';
import { Link, useParams, useSearchParams } from 'react-router';
import type { Page } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { oneEdition, pageOfEdition } from '#src/api/editions.ts';
import { onePage } from '#src/api/pages.ts';
import { useCan } from '#src/api/session.ts';
import { LiveValues } from '#src/blocks/live-value/live-values.tsx';
import { CommentsPanel } from '#src/features/comments/comments-panel.tsx';
import { useNotesOfPage } from '#src/features/comments/use-notes-of-page.ts';
import { editionCell } from '#src/features/editions/edition-words.ts';
import { ReadingChoice } from '#src/features/editions/reading-choice.tsx';
import { useChangeBars } from '#src/features/editions/use-change-bars.ts';
import { type Shown, useEdition } from '#src/features/editions/use-edition.ts';
import { HistoryButton } from '#src/features/history/history-button.tsx';
import { ReadPage } from '#src/features/reader/read-page.tsx';
import { ReviewDeeds } from '#src/features/review/review-deeds.tsx';
import { SettingBar } from '#src/features/reader/setting-bar.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { PageTitle } from '#src/scan/page-title.tsx';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';

export function Component() {
  const { pageId = '' } = useParams();
  const { data: page, error, refetch } = useQuery(onePage(pageId));
  useTitle(page === undefined ? undefined : `Page ${page.label}`);
  if (page !== undefined) return <InEdition key={page.id} page={page} />;
  return <NotYet error={error} onRetry={() => void refetch()} />;
}

const NotYet = ({ error, onRetry }: { error: unknown; onRetry: () => void }): ReactNode => (
  <Screen>
    {error === null ? (
      <Pending what="Fetching the page …" />
    ) : (
      <Failure what="The page could not be fetched" error={error} onRetry={onRetry} />
    )}
  </Screen>
);

/** Finds out which state of the manual is read, and fetches the page as it is there. */
function InEdition({ page }: { page: Page }) {
  const { shown, error, retry } = useEdition(page.manualId);
  const number = shown?.edition?.number;
  const held = useQuery({ ...pageOfEdition(page.manualId, number ?? 0, page.id), enabled: number !== undefined });
  if (shown === undefined) return <NotYet error={error} onRetry={retry} />;
  if (shown.edition === null) return <Reading page={page} shown={shown} isMissing={false} />;
  if (held.data !== undefined) return <Reading page={held.data} shown={shown} isMissing={false} />;
  const isMissing = held.error instanceof AppError && held.error.code === 'not-found';
  if (isMissing) return <Reading page={page} shown={shown} isMissing />;
  return <NotYet error={held.error} onRetry={() => void held.refetch()} />;
}

function Reading({ page, shown, isMissing }: { page: Page; shown: Shown; isMissing: boolean }) {
  const [asked] = useSearchParams();
  const boxes = asked.get('boxes') ?? '';
  const hits = useMemo(() => zonesFrom(boxes), [boxes]);
  const edition = isMissing ? null : shown.edition;
  const { bars, ...barSwitch } = useChangeBars(page, shown.before);
  const kept = asked.get('edition') === null || shown.edition === null ? '' : `?edition=${shown.edition.number}`;
  const mayComment = useCan('comment');
  const notes = useNotesOfPage(page.id);
  const hasMargin = mayComment || notes.length > 0;
  return (
    <LiveValues manualId={page.manualId} edition={edition?.number ?? null}>
      <div className="desk">
        <PageTitle
          page={page}
          doubts={page.doubtCount}
          addressOf={(id) => `/pages/${id}/read${kept}`}
          edition={editionWords(shown, edition)}
          {...usePagesOf(page.manualId, edition?.number)}
        >
          <Deeds page={page} isWork={edition === null} />
        </PageTitle>
        <ReadingChoice manualId={page.manualId} shown={shown} isMissing={isMissing} bars={barSwitch} />
        <SettingBar manualId={page.manualId} startsOpen />
        <ReadPage
          {...{ page, hits, notes, bars }}
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

function editionWords({ latest }: Shown, edition: Shown['edition']): string {
  if (edition !== null) return editionCell(edition);
  return latest === null ? 'none yet: the work' : 'the work';
}

/** The pages of an edition to turn to, once they are known; those of the work otherwise. */
function usePagesOf(manualId: string, number: number | undefined) {
  const { data } = useQuery({ ...oneEdition(manualId, number ?? 0), enabled: number !== undefined });
  const pages = useMemo(() => data?.pages.map(({ pageId, label }) => ({ id: pageId, label })), [data]);
  return pages === undefined ? {} : { pages };
}

/** What can be done with the page. An edition is read; only the work is corrected and signed. */
function Deeds({ page, isWork }: { page: Page; isWork: boolean }) {
  const mayEdit = useCan('edit-pages');
  return (
    <>
      {mayEdit ? (
        <Button asChild>
          <Link to={`/pages/${page.id}`}>Correct this page</Link>
        </Button>
      ) : null}
      {mayEdit && isWork ? <ReviewDeeds page={page} /> : null}
      <HistoryButton pageId={page.id} label={page.label} mayRestore={false} />
      <Button onClick={() => window.print()}>Print</Button>
    </>
  );
}

/** Boxes in an address: `10,20,30,40;50,60,70,80`, or the same as JSON. Anything else is no box. */
function zonesFrom(text: string): Zone[] {
  const numbers = (text.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
  return Array.from({ length: Math.floor(numbers.length / 4) }, (_, at) => numbers.slice(at * 4, at * 4 + 4) as Zone);
}
