import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { can } from '#shared/access/roles.ts';
import type { Thread } from '#shared/api/comments.ts';
import type { Page } from '#shared/api/pages.ts';
import { addReply, resolveComment } from '#src/api/comments.ts';
import { me } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import type { PageNotes } from '#src/scan/use-page-notes.ts';
import { Button } from '#src/ui/button.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { About, shortQuote } from './about.tsx';
import { Remark } from './remark.tsx';
import { RemarkForm } from './remark-form.tsx';

type Props = {
  page: Page;
  thread: Thread;
  notes: PageNotes;
  /** It has left the list that it stood in; the focus must go elsewhere. */
  onGone: () => void;
};

export const threadElementId = (id: string): string => `comment-${id}`;

/** A comment with its replies. While it has the pointer or the focus, its place is lit on both leaves. */
export function ThreadItem({ page, thread, notes, onGone }: Props) {
  const item = useRef<HTMLLIElement>(null);
  const place = notes.places.get(thread.id);
  const focusItem = (): void => {
    if (item.current?.isConnected === true) item.current.focus();
    else onGone();
  };
  const kind = thread.kind === 'question' ? 'Question' : 'Note';
  return (
    <li
      ref={item}
      id={threadElementId(thread.id)}
      tabIndex={-1}
      aria-label={`${kind} by ${thread.author}: ${shortQuote(thread.anchor) || 'a place on the scan'}`}
      className="thread"
      onMouseEnter={() => notes.light(thread.id)}
      onMouseLeave={() => notes.light(null)}
      onFocus={() => notes.light(thread.id)}
      onBlur={({ currentTarget, relatedTarget }) => {
        if (!(relatedTarget instanceof Node && currentTarget.contains(relatedTarget))) notes.light(null);
      }}
    >
      <button type="button" className="thread-place" onClick={() => notes.goTo(thread.id)}>
        <span className="sr-only">Go to </span>
        <About anchor={thread.anchor} page={page} zone={place?.zone ?? thread.anchor.zone} />
      </button>
      {place?.state === 'changed' ? (
        <p className="text-small">
          <StateWord tone="doubt" shape="question">
            The text here has changed since.
          </StateWord>
        </p>
      ) : null}
      {thread.resolved === null ? (
        <p className="cell-label">{kind}</p>
      ) : (
        <StateWord tone="good" shape="tick" className="text-small">
          {kind}, resolved by {thread.resolved.by}
        </StateWord>
      )}
      {thread.isDeleted ? (
        <p className="text-pencil">The words that began this were deleted by their author.</p>
      ) : (
        <Remark pageId={page.id} remark={thread} isAnswered={thread.replies.length > 0} onSettled={focusItem} />
      )}
      {thread.replies.length === 0 ? null : (
        <ol aria-label="Replies" className="thread-replies">
          {thread.replies.map((reply) => (
            <li key={reply.id}>
              <Remark pageId={page.id} remark={reply} onSettled={focusItem} />
            </li>
          ))}
        </ol>
      )}
      <ThreadDeeds {...{ page, thread, onGone }} onDone={focusItem} />
    </li>
  );
}

type DeedsProps = Pick<Props, 'page' | 'thread' | 'onGone'> & { onDone: () => void };

function ThreadDeeds({ page, thread, onGone, onDone }: DeedsProps) {
  const client = useQueryClient();
  const { data: person } = useQuery(me);
  const [isReplying, setReplying] = useState(false);
  const reply = useMutation(addReply(client, page.id));
  const resolve = useMutation(resolveComment(client, page.id));
  if (person === undefined || person === null || !can(person.role, 'comment')) return null;
  const mayResolve = thread.authorId === person.id || can(person.role, 'edit-pages');
  const isResolved = thread.resolved !== null;
  const done = (): void => {
    setReplying(false);
    onDone();
  };
  // By the promise: the item has left its list, and its callbacks with it, before the answer is dealt with.
  const turn = (): Promise<void> =>
    resolve.mutateAsync({ commentId: thread.id, resolved: !isResolved }).then(onGone, () => undefined);
  if (isReplying) {
    return (
      <RemarkForm
        label="Your reply"
        deed="Reply"
        busy={reply.isPending && 'Sending …'}
        error={reply.error}
        onSend={(said) => reply.mutate({ commentId: thread.id, ...said }, { onSuccess: done })}
        onCancel={done}
      />
    );
  }
  return (
    <>
      <div className="mt-2 flex flex-wrap gap-1">
        <Button onClick={() => setReplying(true)}>Reply</Button>
        {mayResolve ? (
          <Button busy={resolve.isPending && (isResolved ? 'Opening it …' : 'Resolving …')} onClick={() => void turn()}>
            {isResolved ? 'Open it again' : 'Resolve'}
          </Button>
        ) : null}
      </div>
      {resolve.error === null ? null : (
        <p role="alert" className="mt-2 text-alarm">
          {saidBy(resolve.error)}
        </p>
      )}
    </>
  );
}
