import { useQuery } from '@tanstack/react-query';
import { lazy, type ReactNode, Suspense } from 'react';
import { Link, useParams, useSearchParams } from 'react-router';
import type { Manual } from '#shared/api/manuals.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { oneManual } from '#src/api/manuals.ts';
import { useCan } from '#src/api/session.ts';
import { OpenCommentsSheet, OpenQuestionsLabel } from '#src/features/comments/open-comments-sheet.tsx';
import { ReadingState } from '#src/features/library/reading-state.tsx';
import { OverviewTitle } from '#src/features/manual/overview-title.tsx';
import { PageStrip } from '#src/features/manual/page-strip.tsx';
import { ReadingControls } from '#src/features/manual/reading-controls.tsx';
import { SourcesSheet } from '#src/features/manual/sources-sheet.tsx';
import { viewIn } from '#src/features/manual/views.ts';
import { PickFiles } from '#src/features/upload/pick-files.tsx';
import { useUploadLine } from '#src/features/upload/uploads.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { Tabs, TabSheet } from '#src/ui/tabs.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';
import { ManualDeeds } from '#src/app/manual/manual-deeds.tsx';
import { ManualUploads } from '#src/app/manual/manual-uploads.tsx';

const PartsSheet = lazy(async () => ({ default: (await import('#src/features/manual/parts-sheet.tsx')).PartsSheet }));
const ReferencesSheet = lazy(async () => ({
  default: (await import('#src/features/manual/references-sheet.tsx')).ReferencesSheet,
}));
const ValuesSheet = lazy(async () => ({
  default: (await import('#src/features/manual/values-sheet.tsx')).ValuesSheet,
}));

export function Component() {
  const { manualId = '' } = useParams();
  const { data: manual, error, isPending, refetch } = useQuery(oneManual(manualId));
  useTitle(manual?.title);
  if (manual !== undefined) return <Overview key={manual.id} manual={manual} />;
  if (isPending) {
    return (
      <Screen>
        <Pending what="Taking the manual out …" />
      </Screen>
    );
  }
  return <NoManual error={error} onRetry={() => void refetch()} />;
}

function NoManual({ error, onRetry }: { error: unknown; onRetry: () => void }) {
  const isMissing = error instanceof AppError && error.code === 'not-found';
  return (
    <Screen>
      <TitleBlock kind="Manual" title={isMissing ? 'There is no such manual' : 'The manual could not be fetched'} />
      <div className="mt-4">
        {isMissing ? (
          <p className="max-w-[70ch]">It may have been put in the bin. An archivist can take it back out.</p>
        ) : (
          <Failure what="What happened" error={error} onRetry={onRetry} />
        )}
      </div>
      <Button look="main" className="mt-4" asChild>
        <Link to="/">Go to the library</Link>
      </Button>
    </Screen>
  );
}

function Overview({ manual }: { manual: Manual }) {
  const { id } = manual;
  const [asked, setAsked] = useSearchParams();
  const mayUpload = useCan('upload-sources');
  const line = useUploadLine();
  const add = (files: File[]): void => line.add(id, files);
  const picker = (look: 'main' | 'plain'): ReactNode =>
    mayUpload ? (
      <PickFiles onFiles={add} look={look}>
        Add scans
      </PickFiles>
    ) : null;
  return (
    <Screen>
      <OverviewTitle manual={manual} reading={<ReadingState manual={manual} />} />
      <ManualDeeds manual={manual} addScans={picker('plain')} />
      {mayUpload ? <ManualUploads manualId={id} title={manual.title} /> : null}
      <ReadingControls manual={manual} />
      <Tabs
        label="Parts of the manual"
        value={viewIn(asked.get('view'))}
        onValueChange={(view) => setAsked(view === 'pages' ? {} : { view }, { replace: true })}
        tabs={[
          { value: 'pages', label: 'Pages' },
          { value: 'parts', label: 'Parts list' },
          { value: 'values', label: 'Values' },
          { value: 'references', label: 'References' },
          { value: 'questions', label: <OpenQuestionsLabel manualId={id} /> },
          { value: 'sources', label: 'Sources' },
        ]}
      >
        <Suspense fallback={<Pending what="Opening …" className="pt-4" />}>
          <TabSheet value="pages">
            <PageStrip manualId={id} pickFiles={picker('main')} />
          </TabSheet>
          <TabSheet value="parts">
            <PartsSheet manualId={id} />
          </TabSheet>
          <TabSheet value="values">
            <ValuesSheet manualId={id} />
          </TabSheet>
          <TabSheet value="references">
            <ReferencesSheet manualId={id} />
          </TabSheet>
          <TabSheet value="questions">
            <OpenCommentsSheet manualId={id} />
          </TabSheet>
          <TabSheet value="sources">
            <SourcesSheet manualId={id} pickFiles={picker('plain')} />
          </TabSheet>
        </Suspense>
      </Tabs>
    </Screen>
  );
}
