import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useParams, useSearchParams } from 'react-router';
import { can } from '#shared/access/roles.ts';
import type { Page } from '#shared/api/pages.ts';
import { onePage } from '#src/api/pages.ts';
import { me, useCan } from '#src/api/session.ts';
import { LiveValues } from '#src/blocks/live-value/live-values.tsx';
import { CommentsPanel } from '#src/features/comments/comments-panel.tsx';
import { useNotesOfPage } from '#src/features/comments/use-notes-of-page.ts';
import { Workspace } from '#src/features/editor/workspace.tsx';
import { HistoryButton } from '#src/features/history/history-button.tsx';
import { PageWarnings } from '#src/features/reading/page-warnings.tsx';
import { ReadPageDialog } from '#src/features/reading/read-page-dialog.tsx';
import { ReviewDeeds } from '#src/features/review/review-deeds.tsx';
import { SettingBar } from '#src/features/reader/setting-bar.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';

export function Component() {
  const { pageId = '' } = useParams();
  const { data: person } = useQuery(me);
  const { data: page, error, refetch } = useQuery(onePage(pageId));
  useTitle(page === undefined ? undefined : `Correct page ${page.label}`);
  if (person !== undefined && person !== null && !can(person.role, 'edit-pages'))
    return <Navigate to={`/pages/${pageId}/read`} replace />;
  if (page !== undefined && person !== undefined) return <Correcting key={page.id} page={page} />;
  return (
    <Screen>
      {error === null ? (
        <Pending what="Fetching the page …" />
      ) : (
        <Failure what="The page could not be fetched" error={error} onRetry={() => void refetch()} />
      )}
    </Screen>
  );
}

function Correcting({ page }: { page: Page }) {
  const mayRead = useCan('run-recognition');
  const notes = useNotesOfPage(page.id);
  const [asked] = useSearchParams();
  return (
    <LiveValues manualId={page.manualId}>
      <Workspace
        page={page}
        notes={notes}
        comments={(places) => (
          <CommentsPanel page={page} notes={places} asked={asked.get('comment')} hasButton={false} />
        )}
        addressOf={(id) => `/pages/${id}`}
        settingBar={
          <>
            <PageWarnings page={page} />
            <SettingBar manualId={page.manualId} startsOpen={false} />
          </>
        }
        links={(isDirty) => (
          <>
            <Button asChild>
              <Link to={`/pages/${page.id}/read`}>Read this page</Link>
            </Button>
            <HistoryButton pageId={page.id} label={page.label} mayRestore hasUnsaved={isDirty} />
            <ReviewDeeds page={page} hasUnsaved={isDirty} />
            {mayRead && page.imageVersion !== null ? <ReadPageDialog page={page} /> : null}
          </>
        )}
      />
    </LiveValues>
  );
}
