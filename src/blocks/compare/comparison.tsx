import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { oneRevision } from '#src/api/revisions.ts';
import { useStored } from '#src/lib/use-stored.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { canonical } from './canonical.ts';
import { type ComparedBlock, compareDocuments } from './compare-blocks.ts';
import { ComparedText, type RestoreCell, wordForKind } from './compared-text.tsx';

const changeWords = {
  changed: 'changed',
  gone: 'deleted',
  new: 'new',
  form: 'same words, other form',
  same: 'unchanged',
} as const;

const views = ['line', 'sides'] as const;
type View = (typeof views)[number];

export type RestorePart = (part: { block: string; cell?: Parameters<RestoreCell>[0] }) => void;

type Props = {
  pageId: string;
  older: number;
  newer: number;
  /** Brings a block or a cell of the older one back; not given where that is not offered. */
  onRestore?: RestorePart | undefined;
};

/** Two revisions of a page, block by block: only what differs, word by word, tables by cell. */
export function Comparison({ pageId, older, newer, onRestore }: Props) {
  const before = useQuery(oneRevision(pageId, older));
  const after = useQuery(oneRevision(pageId, newer));
  const [view, setView] = useStored('benchleaf.compare', views, 'line');
  const blocks = useMemo(
    () =>
      before.data === undefined || after.data === undefined
        ? null
        : compareDocuments(canonical(before.data.document), canonical(after.data.document)).filter(
            ({ change }) => change !== 'same',
          ),
    [before.data, after.data],
  );
  const error = before.error ?? after.error;
  if (error !== null && blocks === null) return <Failure what="The revisions could not be compared" error={error} />;
  if (blocks === null) return <Pending what="Fetching both revisions …" lines={3} />;
  return (
    <section aria-label={`Revision ${older} to ${newer}`} className="mt-4">
      <div className="flex flex-wrap items-center justify-between gap-3">
        <h3 className="font-serif text-lead font-semibold">{`Revision ${older} to ${newer}`}</h3>
        <ToggleGroup
          label="How to compare"
          value={view}
          onValueChange={setView}
          choices={[
            { value: 'line', label: 'In one' },
            { value: 'sides', label: 'Side by side' },
          ]}
        />
      </div>
      {blocks.length === 0 ? <p className="text-pencil">These two are the same.</p> : null}
      <ol className="mt-2 grid grid-cols-[minmax(0,1fr)] gap-3">
        {blocks.map((block) => (
          <li key={block.key} className="border-t border-rule pt-2">
            <Block {...{ block, view, older, newer, onRestore }} />
          </li>
        ))}
      </ol>
    </section>
  );
}

type BlockProps = Omit<Props, 'pageId'> & { block: ComparedBlock; view: View };

function Block({ block, view, older, newer, onRestore }: BlockProps) {
  const { key, kind, change } = block;
  const what = wordForKind(kind);
  const restoreCell: RestoreCell | undefined =
    onRestore === undefined ? undefined : (cell) => onRestore({ block: key, cell });
  return (
    <>
      <div className="flex flex-wrap items-baseline gap-x-4">
        <p className="cell-label">{`${what}, ${changeWords[change]}`}</p>
        {onRestore === undefined || change === 'new' ? null : (
          <Button look="quiet" onClick={() => onRestore({ block: key })}>
            {`Restore this block as in revision ${older}`}
          </Button>
        )}
      </div>
      {view === 'line' || change === 'form' ? (
        <ComparedText block={block} onRestoreCell={restoreCell} />
      ) : (
        <div className="compared-sides">
          {(['older', 'newer'] as const).map((side) => (
            <div key={side} className="min-w-0">
              <p className="text-small text-pencil">{`Revision ${side === 'older' ? older : newer}`}</p>
              <ComparedText block={block} side={side} onRestoreCell={side === 'older' ? restoreCell : undefined} />
            </div>
          ))}
        </div>
      )}
    </>
  );
}
