import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { type Doubt, doubtAt, doubtsLike, doubtsOf } from './doubts.ts';
import type { DoubtWalk } from './use-doubt-walk.ts';

/** The doubts of the page as it stands in the editor, and the one at the caret. */
export function useDoubts(editor: Editor): { doubts: readonly Doubt[]; here: Doubt | undefined } {
  const doc = useEditorState({ editor, selector: ({ editor: now }) => now.state.doc, equalityFn: (a, b) => a === b });
  const position = useEditorState({ editor, selector: ({ editor: now }) => now.state.selection.from });
  const doubts = doubtsOf(doc);
  return { doubts, here: doubtAt(doubts, position) };
}

type Props = { editor: Editor; walk: DoubtWalk; onKeys: () => void };

/** In the margin: how many doubts are left, why there is one here, and what may have been meant. */
export function DoubtStrip({ editor, walk, onKeys }: Props) {
  const { doubts, here } = useDoubts(editor);
  return (
    <section aria-label="Doubts" className="margin-part">
      <h2 className="margin-head">
        <span role="status">
          {doubts.length === 0 ? (
            <StateWord tone="good" shape="tick">
              no doubts left
            </StateWord>
          ) : (
            <StateWord tone="doubt" shape="question">
              {counted(doubts.length, 'doubt')} left
            </StateWord>
          )}
        </span>
      </h2>
      {doubts.length === 0 ? null : (
        <div className="flex flex-wrap gap-1">
          <Button onClick={() => walk.goBeside(1)}>Next doubt</Button>
          <Button onClick={() => walk.goBeside(-1)}>Previous doubt</Button>
        </div>
      )}
      {here === undefined ? null : (
        <div className="mt-2 border-l-2 border-doubt pl-2">
          <p>
            <span className="figures text-lead">{here.text}</span>
          </p>
          <p className="text-pencil">{here.reason}.</p>
          {here.proposals.length === 0 ? null : (
            <div className="mt-1">
              <p className="cell-label">It may have been meant as</p>
              <div className="flex flex-wrap gap-1">
                {here.proposals.map((proposal) => (
                  <Button key={proposal} className="figures" onClick={() => walk.take(here, proposal)}>
                    {proposal}
                  </Button>
                ))}
              </div>
            </div>
          )}
          <Button className="mt-2" look="main" onClick={walk.settle}>
            It is right as it stands
          </Button>
          <LikeThis editor={editor} walk={walk} here={here} alike={doubtsLike(doubts, here)} />
        </div>
      )}
      <p className="mt-2 text-small text-pencil max-md:hidden">
        <kbd>Alt N</kbd> next, <kbd>Alt P</kbd> previous, <kbd>Alt Enter</kbd> right as it stands.{' '}
        <button type="button" className="word-link" onClick={onKeys}>
          All keys
        </button>
      </p>
    </section>
  );
}

type LikeProps = { editor: Editor; walk: DoubtWalk; here: Doubt; alike: readonly Doubt[] };

/** The same word in doubt elsewhere on the page: each shown with what stands around it, and all settled at once. */
function LikeThis({ editor, walk, here, alike }: LikeProps) {
  if (alike.length < 2) return null;
  return (
    <details className="mt-3">
      <summary className="word-link">{`${alike.length} like this on the page`}</summary>
      <ol className="my-2 grid max-h-48 gap-1 overflow-y-auto text-small">
        {alike.map((doubt) => (
          <li key={doubt.from}>
            <button type="button" className="word-link text-left" onClick={() => walk.goTo(doubt)}>
              {around(editor, doubt)}
            </button>
          </li>
        ))}
      </ol>
      <div className="flex flex-wrap gap-1">
        <Button onClick={() => walk.settleAll(alike, null)}>{`All ${alike.length} are right`}</Button>
        {here.proposals.map((proposal) => (
          <Button key={proposal} onClick={() => walk.settleAll(alike, proposal)}>
            All are <span className="figures">{proposal}</span>
          </Button>
        ))}
      </div>
    </details>
  );
}

const lettersAround = 18;

/** The word with some of its line on either side. */
function around({ state: { doc } }: Editor, { from, to, text }: Doubt): string {
  const block = doc.resolve(from);
  const [start, end] = [block.start(), block.end()];
  const before = doc.textBetween(Math.max(start, from - lettersAround), from, ' ', ' ');
  const after = doc.textBetween(to, Math.min(end, to + lettersAround), ' ', ' ');
  return `… ${before}${text}${after} …`;
}
