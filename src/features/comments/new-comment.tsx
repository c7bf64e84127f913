import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { CommentKind } from '#shared/api/comments.ts';
import type { Page } from '#shared/api/pages.ts';
import type { Anchor } from '#shared/document/find-anchor.ts';
import { addComment } from '#src/api/comments.ts';
import { ToggleGroup } from '#src/ui/toggle-group.tsx';
import { About } from './about.tsx';
import { RemarkForm } from './remark-form.tsx';

const kinds = [
  { value: 'question', label: 'Question' },
  { value: 'note', label: 'Note' },
] as const;

type Props = { page: Page; anchor: Anchor; onMade: (id: string) => void; onCancel: () => void };

/** A comment that is being written, with what it is about above it. */
export function NewComment({ page, anchor, onMade, onCancel }: Props) {
  const [kind, setKind] = useState<CommentKind>('question');
  const add = useMutation(addComment(useQueryClient(), page.id));
  const section = useRef<HTMLElement>(null);
  // Another place may be chosen while the words are being written: they stay, and are gone on with.
  useEffect(() => section.current?.querySelector('textarea')?.focus(), [anchor]);
  return (
    <section ref={section} aria-label="New comment" className="thread">
      <About anchor={anchor} page={page} zone={anchor.zone} />
      <RemarkForm
        label={kind === 'question' ? 'Your question' : 'Your note'}
        deed={kind === 'question' ? 'Ask' : 'Put it there'}
        busy={add.isPending && 'Sending …'}
        error={add.error}
        onSend={(said) => add.mutate({ kind, anchor, ...said }, { onSuccess: ({ id }) => onMade(id) })}
        onCancel={onCancel}
      >
        <ToggleGroup label="Kind of comment" choices={kinds} value={kind} onValueChange={setKind} className="mb-2" />
      </RemarkForm>
    </section>
  );
}
