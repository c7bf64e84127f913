import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { EditionDraft } from '#shared/api/editions.ts';
import { counted } from '#shared/kit/counted.ts';
import { editionDraft, publishEdition } from '#src/api/editions.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Field, TextArea } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { toast } from '#src/ui/toast.ts';

type Props = { manualId: string; look?: 'main' | 'plain' };

/** Publishing the manual as it stands, after a look at what speaks against it. */
export function PublishDialog({ manualId, look = 'main' }: Props) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={setOpen}
      width="wide"
      title="Publish an edition"
      intro="Readers are shown the newest edition. It stays as it is now, whatever is corrected later."
      trigger={<Button look={look}>Publish an edition</Button>}
    >
      <Publishing manualId={manualId} onDone={() => setOpen(false)} />
    </Dialog>
  );
}

function Publishing({ manualId, onDone }: { manualId: string; onDone: () => void }) {
  const { data: draft, error, refetch } = useQuery(editionDraft(manualId));
  if (draft === undefined)
    return error === null ? (
      <Pending what="Looking the manual over …" lines={4} />
    ) : (
      <Failure what="The manual could not be looked over" error={error} onRetry={() => void refetch()} />
    );
  if (draft.pages === 0)
    return (
      <Notice kind="doubt" title="There is nothing to publish yet">
        No page of this manual has been read. Publish it when its first pages are.
      </Notice>
    );
  return <PublishForm manualId={manualId} draft={draft} onDone={onDone} />;
}

function PublishForm({ manualId, draft, onDone }: { manualId: string; draft: EditionDraft; onDone: () => void }) {
  const { mutate, isPending, error } = useMutation({
    ...publishEdition(useQueryClient(), manualId),
    onSuccess: ({ number }) => {
      toast(`Edition ${number} is published.`);
      onDone();
    },
  });
  const [name, setName] = useState('');
  const [note, setNote] = useState('');
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        mutate({ number: draft.number, name, note });
      }}
    >
      <Against draft={draft} />
      <Field
        label="Name"
        hint="May be left empty. The date is added by itself."
        value={name}
        maxLength={80}
        onChange={({ currentTarget }) => setName(currentTarget.value)}
      />
      <TextArea
        label="What is new in it"
        value={note}
        maxLength={2000}
        onChange={({ currentTarget }) => setNote(currentTarget.value)}
      />
      {error === null ? null : <Failure what="It was not published" error={error} />}
      <Actions>
        <Button look="main" type="submit" busy={isPending && 'Publishing …'}>
          {`Publish edition ${draft.number} with ${counted(draft.pages, 'page')}`}
        </Button>
        <Button onClick={onDone}>Not now</Button>
      </Actions>
    </form>
  );
}

/** At most so many pages are named; the rest are counted. */
const mostNamed = 12;

function pageNames(pages: readonly { label: string }[]): string {
  const named = pages.slice(0, mostNamed).map(({ label }) => label);
  const left = pages.length - named.length;
  return left === 0 ? named.join(', ') : `${named.join(', ')} and ${left} more`;
}

/** What speaks against publishing now: warnings, not bars. */
function Against({ draft }: { draft: EditionDraft }) {
  const { unread, notProofed, doubts, beingWritten, disagreeing, isSame } = draft;
  const doubtSum = doubts.reduce((sum, { doubtCount }) => sum + doubtCount, 0);
  const lines = [
    isSame ? ['Nothing has changed since the latest edition', ''] : null,
    unread.length === 0 ? null : [`${counted(unread.length, 'page')} not read yet, left out`, pageNames(unread)],
    notProofed.length === 0 ? null : [`${counted(notProofed.length, 'page')} not proofed`, pageNames(notProofed)],
    doubtSum === 0 ? null : [`${counted(doubtSum, 'doubt')} left`, `on ${pageNames(doubts)}`],
    beingWritten.length === 0
      ? null
      : [`${counted(beingWritten.length, 'page')} being written on now, taken as last saved`, pageNames(beingWritten)],
    disagreeing.length === 0
      ? null
      : [
          `The proof does not hold: ${counted(disagreeing.length, 'value')} not as printed`,
          pageNames(disagreeing.map(({ symbol }) => ({ label: symbol }))),
        ],
  ].filter((line) => line !== null);
  if (lines.length === 0)
    return (
      <Notice kind="good" title="Nothing speaks against it" className="mb-4">
        Every page is proofed, no doubt is left and the proof holds.
      </Notice>
    );
  return (
    <Notice kind="doubt" title="Look at this first" className="mb-4">
      <p>You can publish all the same. What is listed is kept with the edition.</p>
      <ul className="mt-1 list-disc pl-5">
        {lines.map(([what, which]) => (
          <li key={what}>
            {what}
            {which === '' ? null : <span className="text-pencil">{`: ${which}`}</span>}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
