import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { type ManualInput, manualInput } from '#shared/api/manuals.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Actions } from '#src/ui/dialog.tsx';
import { Field } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';

type Typed = z.input<typeof manualInput>;

type Props = {
  start?: Typed;
  deed: string;
  busyWords: string;
  onSubmit: (manual: ManualInput) => Promise<unknown>;
  onLeave: () => void;
  children?: ReactNode;
};

const nothingKnown: Typed = { title: '', equipment: null, maker: null, documentNumber: null, editionDate: null };
/** An empty field says that nothing is known, which is not the same as an empty name. */
const orNull = { setValueAs: (value: unknown) => (typeof value === 'string' && value.trim() === '' ? null : value) };

/** What is recorded about a manual. */
export function ManualForm({ start = nothingKnown, deed, busyWords, onSubmit, onLeave, children }: Props) {
  const { register, handleSubmit, setError, formState } = useForm<Typed, unknown, ManualInput>({
    resolver: zodResolver(manualInput),
    defaultValues: start,
  });
  const submit = handleSubmit(async (given) => {
    try {
      await onSubmit(given);
    } catch (error) {
      const issues = error instanceof AppError ? (error.details?.issues ?? []) : [];
      for (const { path, message } of issues) setError(path as keyof Typed, { message });
      setError('root', { message: saidBy(error) });
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Field
        label="Title"
        autoComplete="off"
        hint="As on the cover."
        error={errors.title?.message}
        {...register('title')}
      />
      <div className="grid gap-x-4 sm:grid-cols-2">
        <Field
          label="Equipment"
          autoComplete="off"
          placeholder="HB-12 harbour receiver"
          error={errors.equipment?.message}
          {...register('equipment', orNull)}
        />
        <Field
          label="Maker"
          autoComplete="off"
          placeholder="Tarnholt Works"
          error={errors.maker?.message}
          {...register('maker', orNull)}
        />
        <Field
          label="Document number"
          autoComplete="off"
          className="figures"
          placeholder="TW 112-3"
          error={errors.documentNumber?.message}
          {...register('documentNumber', orNull)}
        />
        <Field
          label="Edition date"
          autoComplete="off"
          className="figures"
          placeholder="1969-08"
          hint="As printed; the year alone will do."
          error={errors.editionDate?.message}
          {...register('editionDate', orNull)}
        />
      </div>
      {children}
      {errors.root?.message === undefined ? null : <Notice kind="alarm">{errors.root.message}</Notice>}
      <Actions>
        <Button look="main" type="submit" busy={isSubmitting && busyWords}>
          {deed}
        </Button>
        <Button onClick={onLeave}>Leave</Button>
      </Actions>
    </form>
  );
}
