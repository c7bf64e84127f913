import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { RevisionSummary } from '#shared/api/revisions.ts';
import { restorePart, restoreRevision, revisionsOfPage } from '#src/api/revisions.ts';
import { counted } from '#shared/kit/counted.ts';
import { Comparison, type RestorePart } from '#src/blocks/compare/comparison.tsx';
import { saidBy } from '#src/lib/said-by.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Confirm } from '#src/ui/confirm.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { toast } from '#src/ui/toast.ts';
import { BlockAuthors } from './block-authors.tsx';

type Props = {
  pageId: string;
  mayRestore: boolean;
  /** Text that is not saved would be left behind by restoring: it has to be saved first. */
  hasUnsaved: boolean;
};

/** Every revision of a page: who saved it, what changed between any two, and the way back to one. */
export function HistoryPanel({ pageId, mayRestore, hasUnsaved }: Props) {
  const { data: revisions, error, refetch } = useQuery(revisionsOfPage(pageId));
  const [chosen, setChosen] = useState<{ older: number; newer: number } | null>(null);
  if (revisions === undefined) {
    return error === null ? (
      <Pending what="Fetching the revisions …" lines={4} />
    ) : (
      <Failure what="The revisions could not be fetched" error={error} onRetry={() => void refetch()} />
    );
  }
  const pair = chosen ?? lastTwo(revisions);
  const [older, newer] = [Math.min(pair.older, pair.newer), Math.max(pair.older, pair.newer)];
  return (
    <>
      {hasUnsaved && mayRestore ? <Notice kind="doubt" title="Save your text before you restore a revision." /> : null}
      <Revisions {...{ revisions, pair, pageId }} onPair={setChosen} mayRestore={mayRestore && !hasUnsaved} />
      {pair.older === pair.newer ? (
        <p className="mt-3 text-pencil">
          {revisions.length < 2 ? 'There is nothing to compare yet.' : 'Choose two different revisions to compare.'}
        </p>
      ) : (
        <Compared
          key={`${older} ${newer}`}
          {...{ pageId, older, newer }}
          mayRestore={mayRestore && newer === revisions[0]?.number}
        />
      )}
      <BlockAuthors pageId={pageId} />
    </>
  );
}

type ComparedProps = {
  pageId: string;
  older: number;
  newer: number;
  /** The newer one is the page as it stands. */ mayRestore: boolean;
};

/** What differs; each block and each cell can be brought back by itself, as an edit of the page as it stands. */
function Compared({ pageId, older, newer, mayRestore }: ComparedProps) {
  const restore = useMutation({
    ...restorePart(useQueryClient(), pageId),
    onSuccess: ({ note }) => toast(`Restored: ${note.toLowerCase()}.`),
    onError: (error) => toast.error(saidBy(error)),
  });
  const onRestore: RestorePart = (part) => restore.mutate({ number: older, baseRevision: newer, ...part });
  return (
    <Comparison {...{ pageId, older, newer }} onRestore={mayRestore && !restore.isPending ? onRestore : undefined} />
  );
}

function lastTwo([last, before]: readonly RevisionSummary[]): Pair {
  const newer = last?.number ?? 0;
  return { older: before?.number ?? newer, newer };
}

type Pair = { older: number; newer: number };
type ListProps = {
  revisions: readonly RevisionSummary[];
  pair: Pair;
  onPair: (pair: Pair) => void;
  pageId: string;
  mayRestore: boolean;
};

function Revisions({ revisions, pair, onPair, pageId, mayRestore }: ListProps) {
  const client = useQueryClient();
  const restore = useMutation(restoreRevision(client, pageId));
  const [asked, setAsked] = useState<number | null>(null);
  const newest = revisions[0]?.number;
  const head = (
    <>
      <Th>From</Th>
      <Th>To</Th>
      <Th>Revision</Th>
      <Th>Saved</Th>
      <Th>By</Th>
      <Th>Note</Th>
      <Th>Doubts</Th>
      <Th>{mayRestore ? 'Restore' : ''}</Th>
    </>
  );
  return (
    <>
      <RuledTable caption="Revisions of this page" head={head}>
        {revisions.map(({ number, savedAt, author, origin, note, doubtCount }) => (
          <tr key={number}>
            {(['older', 'newer'] as const).map((end) => (
              <Td key={end}>
                <input
                  type="radio"
                  name={end}
                  className="size-5 accent-signal"
                  aria-label={`Compare ${end === 'older' ? 'from' : 'to'} revision ${number}`}
                  checked={pair[end] === number}
                  onChange={() => onPair({ ...pair, [end]: number })}
                />
              </Td>
            ))}
            <Td className="figures">{number}</Td>
            <Td className="whitespace-nowrap">{writtenTime(savedAt)}</Td>
            <Td>{origin === 'machine' ? 'Recognition' : author}</Td>
            <Td>{note}</Td>
            <Td className="whitespace-nowrap">{counted(doubtCount, 'doubt')}</Td>
            <Td>
              {mayRestore && number !== newest ? (
                <Button aria-label={`Restore revision ${number}`} onClick={() => setAsked(number)}>
                  Restore
                </Button>
              ) : null}
            </Td>
          </tr>
        ))}
      </RuledTable>
      <Confirm
        isOpen={asked !== null}
        onOpenChange={(isOpen) => (isOpen ? undefined : setAsked(null))}
        title={`Restore revision ${asked ?? ''}?`}
        intro="A new revision is made that is as this one was. The revisions between stay in the list, so this can be undone in the same way."
        deed={`Restore revision ${asked ?? ''}`}
        busy={restore.isPending && 'Restoring …'}
        error={restore.error === null ? null : <p className="text-alarm">{saidBy(restore.error)}</p>}
        onConfirm={() => {
          if (asked === null) return;
          restore.mutate(
            { number: asked },
            {
              onSuccess: ({ number }) => {
                setAsked(null);
                toast(`Restored as revision ${number}.`);
              },
            },
          );
        }}
      />
    </>
  );
}
