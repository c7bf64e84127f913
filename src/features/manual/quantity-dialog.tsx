import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import type { Quantity } from '#shared/api/quantities.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { addQuantity, changeQuantity } from '#src/api/quantities.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions, Dialog } from '#src/ui/dialog.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { QuantityFields } from './quantity-fields.tsx';
import { asChange, fieldAt, readTyped, typedFrom, type TypedQuantity, untyped } from './quantity-form-values.ts';

type Props = { manualId: string; quantity?: Quantity; onClose: () => void };

/** To add a quantity, or to change one. */
export function QuantityDialog({ manualId, quantity, onClose }: Props) {
  const client = useQueryClient();
  const { mutateAsync: add } = useMutation(addQuantity(client, manualId));
  const { mutateAsync: change } = useMutation(changeQuantity(client, manualId));
  const form = useForm<TypedQuantity>({ defaultValues: quantity === undefined ? untyped : typedFrom(quantity) });
  const { handleSubmit, setError, formState } = form;
  const submit = handleSubmit(async (typed) => {
    const read = readTyped(typed);
    if (!read.ok) {
      for (const { field, message } of read.faults) setError(field, { message }, { shouldFocus: true });
      return;
    }
    try {
      if (quantity === undefined) await add(read.quantity);
      else await change({ quantityId: quantity.id, change: asChange(read.quantity) });
      onClose();
    } catch (error) {
      const issues = error instanceof AppError ? (error.details?.issues ?? []) : [];
      for (const { path, message } of issues) setError(fieldAt(path), { message });
      setError('root', { message: saidBy(error) });
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <Dialog
      isOpen
      onOpenChange={onClose}
      width="wide"
      title={quantity === undefined ? 'Add a quantity' : `Change ${quantity.symbol}`}
    >
      <form onSubmit={(event) => void submit(event)} noValidate>
        <QuantityFields form={form} manualId={manualId} />
        {errors.root?.message === undefined ? null : <Notice kind="alarm">{errors.root.message}</Notice>}
        <Actions>
          <Button look="main" type="submit" busy={isSubmitting && 'Keeping it …'}>
            {quantity === undefined ? 'Add this quantity' : 'Keep the change'}
          </Button>
          <Button onClick={onClose}>Leave</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
