import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Quantity } from '#shared/api/quantities.ts';
import { deleteQuantity } from '#src/api/quantities.ts';
import { Confirm } from '#src/ui/confirm.tsx';
import { Failure } from '#src/ui/failure.tsx';

type Props = { manualId: string; quantity: Quantity; onClose: () => void };

export function DeleteQuantity({ manualId, quantity, onClose }: Props) {
  const { mutate, isPending, error } = useMutation(deleteQuantity(useQueryClient(), manualId));
  return (
    <Confirm
      isOpen
      onOpenChange={onClose}
      title={`Delete ${quantity.symbol}?`}
      intro="Places in the pages where it stood show what was printed again. Quantities that are worked out from it can no longer be, and will say so."
      deed={`Delete ${quantity.symbol}`}
      busy={isPending && 'Deleting …'}
      error={error === null ? undefined : <Failure what="It is still there" error={error} />}
      onConfirm={() => mutate(quantity.id, { onSuccess: onClose })}
    />
  );
}
