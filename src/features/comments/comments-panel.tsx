import { useQuery } from '@tanstack/react-query';
import { type RefObject, useEffect, useRef, useState } from 'react';
import type { Thread } from '#shared/api/comments.ts';
import type { Page } from '#shared/api/pages.ts';
import { commentsOfPage } from '#src/api/comments.ts';
import { useCan } from '#src/api/session.ts';
import { keepCaret } from '#src/lib/keep-caret.ts';
import { useMedia } from '#src/lib/use-media.ts';
import type { PageNotes } from '#src/scan/use-page-notes.ts';
import { Button } from '#src/ui/button.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { NewComment } from './new-comment.tsx';
import { ThreadItem, threadElementId } from './thread-item.tsx';
import './comments.css';

type Props = {
  page: Page;
  notes: PageNotes;
  /** A thread that a link leads to. */
  asked: string | null;
  /** The editor has its button among its tools. */
  hasButton: boolean;
};

/** In the margin: what people ask and note about this page, in the order of its places. */
export function CommentsPanel({ page, notes, asked, hasButton }: Props) {
  const { data: threads } = useQuery(commentsOfPage(page.id));
  const isNarrow = useMedia('(width < 768px)');
  const [chosenOpen, setOpen] = useState<boolean | null>(null);
  const head = useRef<HTMLButtonElement>(null);
  const mayComment = useCan('comment') && page.document !== null;
  const isOpen = notes.draft !== null || (chosenOpen ?? (!isNarrow || asked !== null));
  const [wanted, focusThread] = useFocusOf(threads, () => setOpen(true));
  const { opened } = notes;
  useEffect(() => {
    if (opened !== null) focusThread(opened.id);
  }, [opened, focusThread]);
  useAsked(asked, threads, (id) => {
    notes.goTo(id);
    focusThread(id);
  });
  return (
    <section aria-label="Comments" className="margin-part comments">
      <div className="comments-head">
        <h2 className="margin-head">
          <button
            ref={head}
            type="button"
            aria-expanded={isOpen}
            className="comments-turn"
            onClick={() => setOpen(!isOpen)}
          >
            Comments
            <span className="comments-count">{threads === undefined ? '' : `${openOf(threads).length} open`}</span>
          </button>
        </h2>
        {mayComment && hasButton ? (
          <Button onMouseDown={keepCaret} onClick={notes.begin}>
            Comment
          </Button>
        ) : null}
      </div>
      {isOpen ? (
        <>
          <Draft {...{ page, notes }} onMade={focusThread} />
          <Threads {...{ page, notes, wanted, mayComment }} onGone={() => head.current?.focus()} />
        </>
      ) : null}
    </section>
  );
}

const openOf = (threads: readonly Thread[]): Thread[] => threads.filter(({ resolved }) => resolved === null);

type DraftProps = Pick<Props, 'page' | 'notes'> & { onMade: (id: string) => void };

function Draft({ page, notes: { draft, endDraft }, onMade }: DraftProps) {
  if (draft === null) return null;
  if (draft === 'nowhere') return <Nowhere onClose={() => endDraft()} />;
  return (
    <NewComment
      page={page}
      anchor={draft}
      onCancel={() => endDraft()}
      onMade={(id) => {
        endDraft(true);
        onMade(id);
      }}
    />
  );
}

type ThreadsProps = Pick<Props, 'page' | 'notes'> & {
  mayComment: boolean;
  /** A thread that is to have the focus; it may be among the resolved ones. */
  wanted: string | null;
  onGone: () => void;
};

function Threads({ page, notes, mayComment, wanted, onGone }: ThreadsProps) {
  const { data: threads, error, refetch } = useQuery(commentsOfPage(page.id));
  if (threads === undefined) {
    return error === null ? (
      <p role="status" className="text-pencil">
        Fetching the comments …
      </p>
    ) : (
      <Failure what="The comments could not be fetched" error={error} onRetry={() => void refetch()} />
    );
  }
  if (threads.length === 0) return notes.draft === null ? <NoneYet mayComment={mayComment} /> : null;
  const open = openOf(threads);
  const resolved = threads.filter((thread) => thread.resolved !== null);
  const item = (thread: Thread) => <ThreadItem key={thread.id} {...{ page, thread, notes, onGone }} />;
  return (
    <>
      {open.length === 0 ? null : <ol aria-label="Open">{byPlace(open, notes).map(item)}</ol>}
      {resolved.length === 0 ? null : (
        <details className="mt-2" open={resolved.some(({ id }) => id === wanted) || undefined}>
          <summary className="word-link">{`${resolved.length} resolved`}</summary>
          <ol aria-label="Resolved">{byPlace(resolved, notes).map(item)}</ol>
        </details>
      )}
    </>
  );
}

const NoneYet = ({ mayComment }: { mayComment: boolean }) => (
  <p className="text-pencil">
    {mayComment
      ? 'None on this page yet. Choose words and press Comment, or mark a place on the scan.'
      : 'None on this page yet.'}
  </p>
);

function Nowhere({ onClose }: { onClose: () => void }) {
  const close = useRef<HTMLButtonElement>(null);
  useEffect(() => close.current?.focus(), []);
  return (
    <div className="thread">
      <p role="alert">
        Nothing is chosen. Choose words of the page, go to a mark on the spine, or press &ldquo;Comment on a
        place&rdquo; above the scan.
      </p>
      <Button ref={close} className="mt-2" onClick={onClose}>
        Put away
      </Button>
    </div>
  );
}

/** From the top of the page to its foot; those without a place come last. */
function byPlace(threads: readonly Thread[], { places }: PageNotes): Thread[] {
  const heightOf = ({ id }: Thread): number => places.get(id)?.zone?.[1] ?? Infinity;
  return [...threads].sort((a, b) => {
    const [first, second] = [heightOf(a), heightOf(b)];
    return first === second ? 0 : first - second;
  });
}

/** Moves the focus to a thread as soon as it stands in the list. */
function useFocusOf(
  threads: readonly Thread[] | undefined,
  onWanted: () => void,
): [string | null, (id: string) => void] {
  const [wanted, setWanted] = useState<{ id: string } | null>(null);
  const done = useRef<object | null>(null);
  useEffect(() => {
    if (wanted === null || wanted === done.current) return;
    const element = document.getElementById(threadElementId(wanted.id));
    if (element === null) return;
    done.current = wanted;
    element.focus({ preventScroll: true });
    element.scrollIntoView({ block: 'nearest' });
  }, [wanted, threads]);
  const latest: RefObject<() => void> = useRef(onWanted);
  const [focus] = useState(() => (id: string): void => {
    latest.current();
    setWanted({ id });
  });
  return [wanted?.id ?? null, focus];
}

/** Goes once to the thread that the address names. */
function useAsked(asked: string | null, threads: readonly Thread[] | undefined, go: (id: string) => void): void {
  const done = useRef<string | null>(null);
  useEffect(() => {
    if (asked === null || done.current === asked || threads?.some(({ id }) => id === asked) !== true) return;
    done.current = asked;
    go(asked);
  });
}
