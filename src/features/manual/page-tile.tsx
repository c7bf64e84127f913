import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { PageSummary } from '#shared/api/pages.ts';
import { warningKinds } from '#shared/reading/page-warning.ts';
import { imageOf, readPageAgain } from '#src/api/pages.ts';
import { useCan } from '#src/api/session.ts';
import { counted } from '#shared/kit/counted.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { toast } from '#src/ui/toast.ts';
import { PageLabel } from './page-label.tsx';
import { pageLooks } from './page-looks.ts';

const thumbnailWidth = 320;

type Props = {
  manualId: string;
  page: PageSummary;
  /** Who is correcting it at this moment. */
  people: readonly string[];
  isLabelling: boolean;
};

/** One page of the strip: its picture, its name, and what is known about its text. */
export function PageTile({ manualId, page, people, isLabelling }: Props) {
  const mayEdit = useCan('edit-pages');
  const { id, label, state, confidence, doubtCount, problem, warnings } = page;
  const { word, tone, shape } = pageLooks[state];
  const [first, second] = mayEdit
    ? [
        { to: `/pages/${id}`, says: 'Correct' },
        { to: `/pages/${id}/read`, says: 'Read' },
      ]
    : [
        { to: `/pages/${id}/read`, says: 'Read' },
        { to: `/pages/${id}`, says: 'Beside its scan' },
      ];
  return (
    <li className="-m-1 flex flex-col p-1 [contain-intrinsic-size:auto_340px] [content-visibility:auto]">
      <Link
        to={first.to}
        className="block border border-rule bg-leaf hover:border-ink"
        tabIndex={-1}
        aria-hidden="true"
      >
        <Thumbnail page={page} />
      </Link>
      <div className="mt-2 flex items-baseline justify-between gap-2">
        {isLabelling ? (
          <PageLabel key={label} manualId={manualId} page={page} />
        ) : (
          <span className="figures min-w-0 font-semibold break-words">{label}</span>
        )}
        {confidence === null || isLabelling ? null : (
          <span
            className="figures text-small whitespace-nowrap text-pencil"
            title="How sure the reading was of its words, on average"
          >
            {Math.round(confidence)}&#8201;%<span className="sr-only"> sure</span>
          </span>
        )}
      </div>
      <div className="flex flex-wrap gap-x-3 text-small">
        <StateWord tone={tone} shape={shape}>
          {word}
        </StateWord>
        {people.length === 0 ? null : (
          <StateWord tone="signal" shape="dot">
            {`${people.join(', ')} at work`}
          </StateWord>
        )}
        {doubtCount === 0 ? null : <span className="doubtful">{counted(doubtCount, 'doubt')}</span>}
        {warnings.map(({ kind }) => (
          <span key={kind} title={warningKinds[kind].says}>
            <StateWord tone="doubt" shape="question">
              {warningKinds[kind].brief}
            </StateWord>
          </span>
        ))}
      </div>
      {state === 'failed' ? <FailedPage manualId={manualId} page={page} problem={problem} /> : null}
      <div className="mt-1 flex flex-wrap gap-x-4">
        {[first, second].map(({ to, says }) => (
          <Link key={to} to={to} className="word-link" aria-label={`${says}: page ${label}`}>
            {says}
          </Link>
        ))}
      </div>
    </li>
  );
}

function Thumbnail({ page }: { page: PageSummary }) {
  const { id, imageVersion } = page;
  if (imageVersion === null) {
    return (
      <span className="flex aspect-[17/22] items-center justify-center text-small text-pencil">not drawn yet</span>
    );
  }
  return (
    <img
      src={imageOf(id, { width: thumbnailWidth, v: imageVersion })}
      alt=""
      loading="lazy"
      decoding="async"
      width={170}
      height={220}
      className="aspect-[17/22] w-full object-contain"
    />
  );
}

function FailedPage({ manualId, page, problem }: { manualId: string; page: PageSummary; problem: string | null }) {
  const mayRead = useCan('run-recognition');
  const { mutate, isPending } = useMutation(readPageAgain(useQueryClient(), manualId));
  return (
    <div className="mt-1 border-l-4 border-double border-alarm pl-2 text-small">
      <p>{problem ?? 'The reading of this page failed.'}</p>
      {mayRead ? (
        <Button
          className="mt-1"
          busy={isPending && 'Asking …'}
          aria-label={`Try page ${page.label} again`}
          onClick={() => mutate({ pageId: page.id }, { onError: (error) => toast.error(saidBy(error)) })}
        >
          Try again
        </Button>
      ) : null}
    </div>
  );
}
