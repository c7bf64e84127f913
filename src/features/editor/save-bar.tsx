import { useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { inputLook } from '#src/ui/field.tsx';
import { StateWord } from '#src/ui/state-word.tsx';

type Props = { isDirty: boolean; isSaving: boolean; note: string; onNote: (note: string) => void; onSave: () => void };

/** Whether the page is saved, and the way to save it with a word on what was done. */
export function SaveBar({ isDirty, isSaving, note, onNote, onSave }: Props) {
  const [isNoting, setNoting] = useState(false);
  return (
    <div className="save-bar screen-only">
      <span role="status" className="min-w-0 flex-1">
        {isDirty ? (
          <StateWord tone="doubt" shape="half">
            not saved yet; kept in this browser
          </StateWord>
        ) : (
          <StateWord tone="good" shape="tick">
            all saved
          </StateWord>
        )}
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
      <Button look="main" disabled={!isDirty} busy={isSaving && 'Saving …'} onClick={onSave}>
        Save
      </Button>
    </div>
  );
}
