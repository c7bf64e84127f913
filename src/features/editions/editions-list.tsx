import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router';
import type { Edition } from '#shared/api/editions.ts';
import { counted } from '#shared/kit/counted.ts';
import { oneEdition } from '#src/api/editions.ts';
import { useCan } from '#src/api/session.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { RuledTable, Td, Th } from '#src/ui/ruled-table.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { editionName, knownAgainst } from './edition-words.ts';
import { WithdrawDialog } from './withdraw-dialog.tsx';

type Props = { manualId: string; editions: readonly Edition[] };

/** Every edition of a manual, newest first; withdrawn ones stay, with the reason. */
export function EditionsList({ manualId, editions }: Props) {
  return (
    <ol className="border-t border-ink">
      {editions.map((edition) => (
        <li key={edition.id} className="border-b border-rule py-4">
          <EditionEntry manualId={manualId} edition={edition} />
        </li>
      ))}
    </ol>
  );
}

function EditionEntry({ manualId, edition }: { manualId: string; edition: Edition }) {
  const mayPublish = useCan('publish-editions');
  const [arePagesOpen, setPagesOpen] = useState(false);
  const { number, note, publishedAt, publishedBy, standing, withdrawn, firstPageId } = edition;
  const against = knownAgainst(edition);
  return (
    <article aria-label={editionName(edition)}>
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h3 className="font-serif text-lead font-semibold">{editionName(edition)}</h3>
        <EditionState edition={edition} />
      </div>
      <p className="text-pencil">
        {`Published ${writtenTime(publishedAt)} by ${publishedBy}, ${counted(standing.pages, 'page')}`}
      </p>
      {withdrawn === null ? null : (
        <p className="mt-1 text-alarm">{`Withdrawn ${writtenTime(withdrawn.at)} by ${withdrawn.by}: ${withdrawn.reason}`}</p>
      )}
      {note === '' ? null : <p className="mt-2 max-w-[70ch] whitespace-pre-line">{note}</p>}
      <p className="mt-2">
        {against.length === 0 ? (
          <StateWord tone="good" shape="double-tick">
            all pages proofed, no doubts, the proof held
          </StateWord>
        ) : (
          <StateWord tone="doubt" shape="question">
            {`when published: ${against.join(', ')}`}
          </StateWord>
        )}
      </p>
      <div className="screen-only mt-2 flex flex-wrap gap-3">
        <Button asChild>
          <Link to={`/pages/${firstPageId}/read?edition=${number}`} aria-label={`Read edition ${number}`}>
            Read it
          </Link>
        </Button>
        <Button
          aria-expanded={arePagesOpen}
          aria-label={`Pages of edition ${number}`}
          onClick={() => setPagesOpen(!arePagesOpen)}
        >
          {arePagesOpen ? 'Fold its pages' : 'Its pages'}
        </Button>
        {mayPublish && withdrawn === null ? <WithdrawDialog manualId={manualId} edition={edition} /> : null}
      </div>
      {arePagesOpen ? <PagesOf manualId={manualId} number={number} /> : null}
    </article>
  );
}

function EditionState({ edition: { withdrawn, isLatest } }: { edition: Edition }) {
  if (withdrawn !== null)
    return (
      <StateWord tone="alarm" shape="cross">
        withdrawn
      </StateWord>
    );
  return isLatest ? (
    <StateWord tone="good" shape="tick">
      what readers see
    </StateWord>
  ) : (
    <StateWord tone="pencil" shape="ring">
      followed by a later one
    </StateWord>
  );
}

function PagesOf({ manualId, number }: { manualId: string; number: number }) {
  const { data, error, refetch } = useQuery(oneEdition(manualId, number));
  if (data === undefined)
    return error === null ? (
      <Pending what="Fetching its pages …" lines={3} />
    ) : (
      <Failure what="Its pages could not be fetched" error={error} onRetry={() => void refetch()} />
    );
  const head = (
    <>
      <Th>Page</Th>
      <Th>Revision</Th>
      <Th>State</Th>
      <Th>Signed off by</Th>
      <Th>Doubts</Th>
    </>
  );
  return (
    <div className="mt-3">
      <RuledTable caption={`Pages of edition ${number}`} head={head}>
        {data.pages.map(({ pageId, label, revision, state, signedBy, doubtCount }) => (
          <tr key={pageId}>
            <Td>
              <Link className="word-link figures" to={`/pages/${pageId}/read?edition=${number}`}>
                {label}
              </Link>
            </Td>
            <Td className="figures">{revision}</Td>
            <Td>{state}</Td>
            <Td>{signedBy ?? 'nobody'}</Td>
            <Td className="figures">{doubtCount}</Td>
          </tr>
        ))}
      </RuledTable>
    </div>
  );
}
