import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { PlacedThread } from '#shared/api/comments.ts';
import { counted } from '#shared/kit/counted.ts';
import { openComments } from '#src/api/comments.ts';
import { writtenTime } from '#src/lib/written.ts';
import { Empty } from '#src/ui/empty.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { Pending } from '#src/ui/pending.tsx';
import { SectionHead } from '#src/ui/screen.tsx';
import { shortQuote } from './about.tsx';
import './comments.css';

/** How many questions of a manual wait for an answer; empty words while that is not known. */
export function OpenQuestionsLabel({ manualId }: { manualId: string }) {
  const { data } = useQuery(openComments(manualId));
  const count = data?.filter(({ kind }) => kind === 'question').length ?? 0;
  return count === 0 ? 'Questions' : counted(count, 'open question');
}

/** What is still open on the pages of a manual: questions first, then notes, each leading to its place. */
export function OpenCommentsSheet({ manualId }: { manualId: string }) {
  const { data: threads, error, isPending, refetch } = useQuery(openComments(manualId));
  if (isPending) return <Pending what="Fetching the questions …" />;
  if (threads === undefined)
    return <Failure what="The questions could not be fetched" error={error} onRetry={() => void refetch()} />;
  const questions = threads.filter(({ kind }) => kind === 'question');
  const notes = threads.filter(({ kind }) => kind === 'note');
  if (threads.length === 0)
    return (
      <Empty title="No question is open">
        Open a page, choose words or mark a place on its scan, and press Comment. What is asked and noted there is
        listed here until it is resolved.
      </Empty>
    );
  return (
    <>
      <Threads title={counted(questions.length, 'open question')} threads={questions} />
      {notes.length === 0 ? null : <Threads title={counted(notes.length, 'open note')} threads={notes} />}
    </>
  );
}

function Threads({ title, threads }: { title: string; threads: readonly PlacedThread[] }) {
  return (
    <section className="mb-8">
      <SectionHead title={title.charAt(0).toUpperCase() + title.slice(1)} />
      <ol className="max-w-[80ch]">
        {threads.map((thread) => (
          <li key={thread.id} className="border-t border-rule py-3">
            <p>
              <Link className="word-link font-semibold" to={`/pages/${thread.pageId}/read?comment=${thread.id}`}>
                Page <span className="figures">{thread.pageLabel}</span>
                {shortQuote(thread.anchor) === '' ? ', a place on the scan' : ': '}
                <span className="thread-quote">{shortQuote(thread.anchor)}</span>
              </Link>
            </p>
            <p className="thread-words">
              {thread.isDeleted ? 'The words that began this were deleted.' : thread.words}
            </p>
            <p className="text-small text-pencil">
              {thread.author}, {writtenTime(thread.createdAt)}, {counted(thread.replies.length, 'reply', 'replies')}
            </p>
          </li>
        ))}
      </ol>
    </section>
  );
}
