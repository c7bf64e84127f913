import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Edition } from '#shared/api/editions.ts';
import { withdrawEdition } from '#src/api/editions.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Failure } from '#src/ui/failure.tsx';
import { TextArea } from '#src/ui/field.tsx';
import { toast } from '#src/ui/toast.ts';

/** Taking an edition back, with the reason. It stays in the list. */
export function WithdrawDialog({ manualId, edition: { number } }: { manualId: string; edition: Edition }) {
  const [isOpen, setOpen] = useState(false);
  const { mutate, isPending, error } = useMutation({
    ...withdrawEdition(useQueryClient(), manualId),
    onSuccess: () => toast(`Edition ${number} is withdrawn.`),
  });
  const [reason, setReason] = useState('');
  const [isAsked, setAsked] = useState(false);
  const isMissing = reason.trim() === '';
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={setOpen}
      title={`Withdraw edition ${number}?`}
      intro="It stays in the list, marked as withdrawn, and can still be read. Readers are shown the newest edition that stands."
      trigger={<Button aria-label={`Withdraw edition ${number}`}>Withdraw</Button>}
    >
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          setAsked(true);
          if (isMissing) return;
          mutate({ number, reason });
        }}
      >
        <TextArea
          label="Why"
          value={reason}
          maxLength={500}
          error={isAsked && isMissing ? 'Say why it is withdrawn.' : undefined}
          onChange={({ currentTarget }) => setReason(currentTarget.value)}
        />
        {error === null ? null : <Failure what="It was not withdrawn" error={error} />}
        <Actions>
          <Button look="danger" type="submit" busy={isPending && 'Withdrawing …'}>
            {`Withdraw edition ${number}`}
          </Button>
          <Button onClick={() => setOpen(false)}>Leave it published</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
