import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Remark as RemarkData } from '#shared/api/comments.ts';
import { changeComment, deleteComment } from '#src/api/comments.ts';
import { me } from '#src/api/session.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Button } from '#src/ui/button.tsx';
import { Confirm } from '#src/ui/confirm.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { cutAtNames } from './mention.ts';
import { RemarkForm } from './remark-form.tsx';

type Props = {
  pageId: string;
  remark: RemarkData;
  /** Replies of others stand under it. */
  isAnswered?: boolean;
  /** What held the focus has gone, or has been put away. */
  onSettled: () => void;
};

/** Somebody's words, with who said them and when. Their author may change them or take them back. */
export function Remark({ pageId, remark, isAnswered = false, onSettled }: Props) {
  const client = useQueryClient();
  const { data: person } = useQuery(me);
  const [state, setState] = useState<'read' | 'change' | 'delete'>('read');
  const change = useMutation(changeComment(client, pageId));
  const remove = useMutation(deleteComment(client, pageId));
  const done = (): void => {
    setState('read');
    onSettled();
  };
  if (state === 'change') {
    return (
      <RemarkForm
        label="Your words"
        deed="Change them"
        start={remark}
        busy={change.isPending && 'Sending …'}
        error={change.error}
        onSend={(said) => change.mutate({ commentId: remark.id, ...said }, { onSuccess: done })}
        onCancel={done}
      />
    );
  }
  const when = writtenTime(remark.createdAt);
  return (
    <>
      <p className="text-small text-pencil">
        <span className="font-semibold text-ink">{remark.author}</span>, <time dateTime={remark.createdAt}>{when}</time>
        {remark.editedAt === null ? '' : ', changed'}
      </p>
      <p className="thread-words">
        {cutAtNames(remark.words, remark.mentions).map(({ text, isName }, at) =>
          isName ? <b key={at}>{text}</b> : text,
        )}
      </p>
      {person?.id === remark.authorId ? (
        <div className="thread-deeds">
          <Button look="quiet" aria-label={`Change your words of ${when}`} onClick={() => setState('change')}>
            Change
          </Button>
          <Button look="quiet" aria-label={`Delete your words of ${when}`} onClick={() => setState('delete')}>
            Delete
          </Button>
        </div>
      ) : null}
      <Confirm
        isOpen={state === 'delete'}
        onOpenChange={(isOpen) => (isOpen ? undefined : setState('read'))}
        title="Delete your words?"
        intro={isAnswered ? 'The replies stay. What you wrote cannot be brought back.' : 'They cannot be brought back.'}
        deed="Delete them"
        busy={remove.isPending && 'Deleting …'}
        // By the promise: the words may have left the screen, and their callbacks with them, before the answer is dealt with.
        onConfirm={() => void remove.mutateAsync(remark.id).then(done, () => undefined)}
        error={remove.error === null ? null : <Failure what="They were not deleted" error={remove.error} />}
      />
    </>
  );
}
