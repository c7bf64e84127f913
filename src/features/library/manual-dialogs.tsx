import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Manual } from '#shared/api/manuals.ts';
import { addManual, binManual, changeManual } from '#src/api/manuals.ts';
import { Confirm } from '#src/ui/confirm.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { ManualForm } from './manual-form.tsx';

type Shared = { isOpen: boolean; onOpenChange: (isOpen: boolean) => void };

type AddProps = Shared & {
  /** A title to begin with, from the name of a dropped file. */
  title?: string;
  onAdded: (manual: Manual) => void;
  /** Where files are given with it. */
  children?: ReactNode;
};

export function AddManual({ isOpen, onOpenChange, title = '', onAdded, children }: AddProps) {
  const { mutateAsync } = useMutation(addManual(useQueryClient()));
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={onOpenChange}
      title="Add a manual"
      width="wide"
      intro="Only the title is needed now. The rest can be filled in when the pages have been read."
    >
      <ManualForm
        start={{ title, equipment: null, maker: null, documentNumber: null, editionDate: null }}
        deed="Add this manual"
        busyWords="Adding …"
        onSubmit={async (given) => onAdded(await mutateAsync(given))}
        onLeave={() => onOpenChange(false)}
      >
        {children}
      </ManualForm>
    </Dialog>
  );
}

export function EditManual({ isOpen, onOpenChange, manual }: Shared & { manual: Manual }) {
  const { mutateAsync } = useMutation(changeManual(useQueryClient(), manual.id));
  const { title, equipment, maker, documentNumber, editionDate } = manual;
  return (
    <Dialog isOpen={isOpen} onOpenChange={onOpenChange} title="What is recorded about this manual" width="wide">
      <ManualForm
        start={{ title, equipment, maker, documentNumber, editionDate }}
        deed="Keep these facts"
        busyWords="Keeping …"
        onSubmit={async (given) => {
          await mutateAsync(given);
          onOpenChange(false);
        }}
        onLeave={() => onOpenChange(false)}
      />
    </Dialog>
  );
}

export function BinManual({
  isOpen,
  onOpenChange,
  manual,
  onBinned,
}: Shared & { manual: Manual; onBinned: () => void }) {
  const { mutate, isPending, error } = useMutation(binManual(useQueryClient()));
  return (
    <Confirm
      isOpen={isOpen}
      onOpenChange={onOpenChange}
      title="Put this manual in the bin?"
      intro={`“${manual.title}” is no longer found or read by anybody. Nothing of it is lost: an archivist can take it back out of the bin.`}
      deed="Put it in the bin"
      busy={isPending && 'Putting it in the bin …'}
      error={error === null ? undefined : <Failure what="It is still where it was" error={error} />}
      onConfirm={() => mutate(manual.id, { onSuccess: onBinned })}
    />
  );
}
