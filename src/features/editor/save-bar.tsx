import { useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { type Shape, StateWord, type Tone } from '#src/ui/state-word.tsx';
import type { Standing } from './use-shared-text.ts';

type Props = {
  standing: Standing;
  isDirty: boolean;
  isSaving: boolean;
  others: readonly string[];
  note: string;
  onNote: (note: string) => void;
  onSave: () => void;
};

function stateOf({ standing, isDirty }: Pick<Props, 'standing' | 'isDirty'>): {
  word: string;
  tone: Tone;
  shape: Shape;
} {
  if (standing !== 'together') return { word: 'kept in this browser', tone: 'doubt', shape: 'question' };
  return isDirty
    ? { word: 'kept, not a revision yet', tone: 'doubt', shape: 'half' }
    : { word: 'all saved', tone: 'good', shape: 'tick' };
}

/** How the page stands, who else is on it, and the way to make a revision with a word on what was done. */
export function SaveBar({ standing, isDirty, isSaving, others, note, onNote, onSave }: Props) {
  const [isNoting, setNoting] = useState(false);
  const { word, tone, shape } = stateOf({ standing, isDirty });
  return (
    <div className="save-bar screen-only">
      <span role="status" className="flex min-w-0 flex-1 flex-wrap gap-x-4">
        <StateWord tone={tone} shape={shape}>
          {word}
        </StateWord>
        {others.length === 0 ? null : <span className="text-pencil">{`on this page: you, ${others.join(', ')}`}</span>}
      </span>
      {isNoting ? (
        <input
          aria-label="Note on this revision"
          placeholder="What was done"
          className={`${inputLook} w-48!`}
          value={note}
          maxLength={500}
          onChange={({ currentTarget }) => onNote(currentTarget.value)}
        />
      ) : (
        <Button onClick={() => setNoting(true)}>Add a note</Button>
      )}
      <Button look="main" disabled={!isDirty || standing !== 'together'} busy={isSaving && 'Saving …'} onClick={onSave}>
        Save
      </Button>
    </div>
  );
}
