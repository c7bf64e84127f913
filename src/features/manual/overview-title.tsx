import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { Manual } from '#shared/api/manuals.ts';
import { editionsOfManual } from '#src/api/editions.ts';
import { proofOfManual } from '#src/api/quantities.ts';
import { writtenDay } from '#src/lib/written.ts';
import { BusyWords } from '#src/ui/pending.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { TitleBlock } from '#src/ui/title-block.tsx';

/** The title block of a manual: which document it is, and how far it can be trusted. */
export function OverviewTitle({ manual, reading }: { manual: Manual; reading: ReactNode }) {
  const { title, equipment, maker, documentNumber, editionDate, pageCounts, doubtCount } = manual;
  return (
    <TitleBlock
      kind="Manual"
      title={title}
      under={[equipment, maker].filter(Boolean).join(', ') || undefined}
      cells={[
        { label: 'Document', value: documentNumber ?? unknown, isFigure: documentNumber !== null, stays: true },
        { label: 'Printed', value: editionDate ?? unknown, isFigure: editionDate !== null },
        { label: 'Edition', value: <LatestEdition manualId={manual.id} />, stays: true },
        { label: 'Pages', value: String(pageCounts.all), isFigure: true },
        {
          label: 'Doubts',
          value: doubtCount === 0 ? '0' : <span className="doubtful">{doubtCount}</span>,
          isFigure: true,
          stays: true,
        },
        { label: 'Proof', value: <ProofState manualId={manual.id} />, stays: true, isWide: true },
        { label: 'Reading', value: reading, isWide: true },
      ]}
    />
  );
}

const unknown = <span className="text-pencil">not recorded</span>;

function LatestEdition({ manualId }: { manualId: string }) {
  const { data: editions, isError } = useQuery(editionsOfManual(manualId));
  if (isError) return 'could not be fetched';
  if (editions === undefined) return <BusyWords>being looked up</BusyWords>;
  const latest = editions.find(({ isLatest }) => isLatest);
  if (latest === undefined) return <span className="text-pencil">none published</span>;
  return (
    <Link
      className="word-link"
      to={`/manuals/${manualId}/editions`}
    >{`${latest.number}, ${writtenDay(latest.publishedAt)}`}</Link>
  );
}

function ProofState({ manualId }: { manualId: string }) {
  const { data: proof, isError } = useQuery(proofOfManual(manualId));
  if (isError)
    return (
      <StateWord tone="alarm" shape="cross">
        could not be made
      </StateWord>
    );
  if (proof === undefined) return <BusyWords>being made</BusyWords>;
  const failing = proof.items.filter(({ agrees }) => !agrees).length;
  if (proof.items.length === 0)
    return (
      <StateWord tone="pencil" shape="ring">
        no values yet
      </StateWord>
    );
  return proof.holds ? (
    <StateWord tone="good" shape="tick">{`holds, ${proof.items.length} values`}</StateWord>
  ) : (
    <StateWord tone="alarm" shape="cross">{`fails: ${failing} of ${proof.items.length}`}</StateWord>
  );
}
