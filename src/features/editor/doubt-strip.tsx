import type { Editor } from '@tiptap/core';
import { useEditorState } from '@tiptap/react';
import { counted } from '#shared/kit/counted.ts';
import { Button } from '#src/ui/button.tsx';
import { StateWord } from '#src/ui/state-word.tsx';
import { type Doubt, doubtAt, doubtsOf } from './doubts.ts';
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
