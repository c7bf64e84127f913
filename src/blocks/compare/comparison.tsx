import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { oneRevision } from '#src/api/revisions.ts';
import { canonical } from './canonical.ts';
import { compareDocuments } from './compare-blocks.ts';
import { ComparedText, wordForKind } from './compared-text.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';

const changeWords = {
  changed: 'changed',
  gone: 'deleted',
  new: 'new',
  form: 'same words, other form',
  same: 'unchanged',
} as const;

/** Two revisions of a page, block by block: only what differs, word by word, tables by row. */
export function Comparison({ pageId, older, newer }: { pageId: string; older: number; newer: number }) {
  const before = useQuery(oneRevision(pageId, older));
  const after = useQuery(oneRevision(pageId, newer));
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
      <h3 className="font-serif text-lead font-semibold">{`Revision ${older} to ${newer}`}</h3>
      {blocks.length === 0 ? <p className="text-pencil">These two are the same.</p> : null}
      <ol className="mt-2 grid gap-3">
        {blocks.map((block) => (
          <li key={block.key} className="border-t border-rule pt-2">
            <p className="cell-label">{`${wordForKind(block.kind)}, ${changeWords[block.change]}`}</p>
            <ComparedText block={block} />
          </li>
        ))}
      </ol>
    </section>
  );
}
