import { type ReactNode, useState } from 'react';
import type { PersonName } from '#shared/api/people.ts';
import type { Said } from '#src/api/comments.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { WordsField } from './words-field.tsx';

type Props = {
  label: string;
  /** What the button says. */
  deed: string;
  start?: { words: string; mentions: readonly PersonName[] };
  busy: string | false;
  error: unknown;
  onSend: (said: Said) => void;
  onCancel: () => void;
  /** Stands between the words and the buttons. */
  children?: ReactNode;
};

/** Words to be sent: a new comment, a reply, or one's own words being changed. */
export function RemarkForm({ label, deed, start, busy, error, onSend, onCancel, children }: Props) {
  const [words, setWords] = useState(start?.words ?? '');
  const [people, setPeople] = useState<readonly PersonName[]>(start?.mentions ?? []);
  const isEmpty = words.trim() === '';
  const send = (): void => {
    if (isEmpty || busy !== false) return;
    const called = people.filter(({ name }) => words.includes(`@${name}`)).map(({ id }) => id);
    onSend({ words: words.trim(), mentions: [...new Set(called)] });
  };
  return (
    <div className="mt-2">
      <WordsField
        {...{ label, words, onCancel }}
        onWords={setWords}
        onMention={(person) => setPeople((before) => [...before, person])}
        onSend={send}
      />
      {children}
      {error === null ? null : (
        <p role="alert" className="mb-2 text-alarm">
          {saidBy(error)}
        </p>
      )}
      <div className="flex flex-wrap gap-1">
        <Button look="main" disabled={isEmpty} busy={busy} onClick={send}>
          {deed}
        </Button>
        <Button onClick={onCancel}>Leave it</Button>
      </div>
    </div>
  );
}
