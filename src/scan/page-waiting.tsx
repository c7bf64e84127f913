import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { Page } from '#shared/api/pages.ts';
import { lookAtPage, readPageAgain } from '#src/api/pages.ts';
import { useCan } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { Pending } from '#src/ui/pending.tsx';

/** A page that somebody looks at is read before the others. */
export function useAttention({ id, state }: Pick<Page, 'id' | 'state'>): void {
  useEffect(() => {
    if (state === 'waiting') void lookAtPage(id);
  }, [id, state]);
}

/** Stands where the text will be: what is happening to the page, and what can be done about it. */
export function PageWaiting({ page }: { page: Page }) {
  if (page.state === 'failed') return <Failed page={page} />;
  if (page.state === 'waiting')
    return (
      <Pending what="This page waits to be read. It has been put first in the queue; its text appears here by itself." />
    );
  if (page.state === 'reading')
    return (
      <Pending what="This page is being read: straightened, its words found, its lines put in order. The text appears here by itself." />
    );
  return (
    <Notice kind="doubt" title="This page has no text.">
      Nothing was found on it that could be read.
    </Notice>
  );
}

function Failed({ page }: { page: Page }) {
  const client = useQueryClient();
  const again = useMutation(readPageAgain(client, page.manualId));
  const mayRead = useCan('run-recognition');
  return (
    <Notice
      kind="alarm"
      title="This page could not be read."
      action={
        mayRead ? (
          <Button
            busy={again.isPending && 'Putting it in the queue …'}
            onClick={() => again.mutate({ pageId: page.id })}
          >
            Try again
          </Button>
        ) : undefined
      }
    >
      {page.problem ?? 'The reason is not known.'} {mayRead ? '' : 'Ask an archivist to try again.'}
      {again.error === null ? null : <p className="font-semibold">{saidBy(again.error)}</p>}
    </Notice>
  );
}
