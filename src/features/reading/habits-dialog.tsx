import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { type Manual, updateManual } from '#shared/api/manuals.ts';
import { changeManual } from '#src/api/manuals.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { TextArea } from '#src/ui/field.tsx';

type Props = { isOpen: boolean; onOpenChange: (isOpen: boolean) => void; manual: Manual };

/** What the reading of this manual goes by besides the scan. */
export function HabitsDialog({ isOpen, onOpenChange, manual }: Props) {
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={onOpenChange}
      title="How this manual is read"
      intro="Both bear on pages that nobody has touched yet. What people wrote is never changed."
    >
      {isOpen ? <Habits manual={manual} onDone={() => onOpenChange(false)} /> : null}
    </Dialog>
  );
}

function Habits({ manual, onDone }: { manual: Manual; onDone: () => void }) {
  const { mutate, isPending, error } = useMutation(changeManual(useQueryClient(), manual.id));
  const [learns, setLearns] = useState(manual.learns);
  const [units, setUnits] = useState(manual.ownUnits.join(', '));
  const ownUnits = [...new Set(units.split(/[\s,;]+/).filter((unit) => unit !== ''))];
  const isTaken = updateManual.body.safeParse({ ownUnits }).success;
  return (
    <>
      <label className="mb-4 flex items-start gap-2">
        <input
          type="checkbox"
          className="mt-1 size-4 accent-ink"
          checked={learns}
          onChange={({ currentTarget }) => setLearns(currentTarget.checked)}
        />
        <span>
          Learn from corrected pages
          <span className="block text-small text-pencil">
            Words that stand on two of them are no longer doubted elsewhere; what was corrected there is proposed.
          </span>
        </span>
      </label>
      <TextArea
        label="Units as this manual writes them"
        className="figures"
        hint="Beyond the usual ones, with commas between: uuf, mmfd. They are left as they were read."
        value={units}
        error={isTaken ? undefined : 'Up to 40 units of at most 12 letters.'}
        onChange={({ currentTarget }) => setUnits(currentTarget.value)}
      />
      {error === null ? null : (
        <p role="alert" className="text-alarm">
          {saidBy(error)}
        </p>
      )}
      <Actions>
        <Button
          look="main"
          disabled={!isTaken}
          busy={isPending && 'Keeping …'}
          onClick={() => mutate({ learns, ownUnits }, { onSuccess: onDone })}
        >
          Keep this
        </Button>
        <Button onClick={onDone}>Leave</Button>
      </Actions>
    </>
  );
}
