import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import type { Edition } from '#shared/api/editions.ts';
import type { Manual } from '#shared/api/manuals.ts';
import { counted } from '#shared/kit/counted.ts';
import { editionsOfManual } from '#src/api/editions.ts';
import { oneManual } from '#src/api/manuals.ts';
import { useCan } from '#src/api/session.ts';
import { DifferenceView } from '#src/features/editions/difference-view.tsx';
import { editionCell } from '#src/features/editions/edition-words.ts';
import { EditionsList } from '#src/features/editions/editions-list.tsx';
import { PublishDialog } from '#src/features/editions/publish-dialog.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { Screen } from '#src/ui/screen.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

/** What has been published of a manual, and what changed from one edition to the next. */
export function Component() {
  const { manualId = '' } = useParams();
  const manual = useQuery(oneManual(manualId));
  const editions = useQuery(editionsOfManual(manualId));
  useTitle(manual.data === undefined ? undefined : `Editions: ${manual.data.title}`);
  if (manual.data !== undefined && editions.data !== undefined)
    return <Editions manual={manual.data} editions={editions.data} />;
  const error = manual.error ?? editions.error;
  return (
    <Screen>
      {error === null ? (
        <Pending what="Taking the editions out …" />
      ) : (
        <Failure
          what="The editions could not be fetched"
          error={error}
          onRetry={() => {
            void manual.refetch();
            void editions.refetch();
          }}
        />
      )}
    </Screen>
  );
}

function Editions({ manual, editions }: { manual: Manual; editions: Edition[] }) {
  const mayPublish = useCan('publish-editions');
  const latest = editions.find(({ isLatest }) => isLatest);
  const { all, proofed } = manual.pageCounts;
  return (
    <Screen>
      <TitleBlock
        kind="Editions"
        title={
          <Link to={`/manuals/${manual.id}`} className="hover:underline">
            {manual.title}
          </Link>
        }
        under={[manual.maker, manual.documentNumber].filter(Boolean).join(', ') || undefined}
        cells={[
          { label: 'Edition', value: latest === undefined ? 'none published' : editionCell(latest), stays: true },
          { label: 'Proofed', value: `${proofed} of ${counted(all, 'page')}`, stays: true },
          { label: 'Doubts', value: String(manual.doubtCount), isFigure: true },
        ]}
      />
      {editions.length === 0 ? (
        <div className="mt-6">
          <Empty
            title="Nothing has been published yet"
            action={mayPublish ? <PublishDialog manualId={manual.id} /> : undefined}
          >
            {mayPublish
              ? 'Until there is an edition, readers see the work as it stands. Publish one when the pages are proofed.'
              : 'Until there is an edition, you read the work as it stands. An editor publishes it when the pages are proofed.'}
          </Empty>
        </div>
      ) : (
        <>
          <div className="screen-only my-4">{mayPublish ? <PublishDialog manualId={manual.id} /> : null}</div>
          <h2 className="sr-only">Editions of this manual</h2>
          <EditionsList manualId={manual.id} editions={editions} />
          <DifferenceView manualId={manual.id} editions={editions} />
        </>
      )}
    </Screen>
  );
}
