import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { askForPasswordLink } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Field } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';

const wanted = z.object({ email: z.email('Give the e-mail address of your account.') });

/** Says the same whether or not there is such an account, so that nobody can find out who has one. */
export function ForgottenForm({ onBack }: { onBack: () => void }) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(wanted),
    defaultValues: { email: '' },
  });
  const submit = handleSubmit(async ({ email }) => {
    try {
      await askForPasswordLink({ email });
      setSentTo(email);
    } catch (error) {
      setError('root', { message: saidBy(error) });
    }
  });
  const back = (
    <Button look="quiet" onClick={onBack}>
      Back to signing in
    </Button>
  );
  if (sentTo !== null) {
    return (
      <>
        <Notice kind="good" title="Look in your mail" isUrgent>
          If {sentTo} has an account here, a link to choose a new password is on its way. It works once.
        </Notice>
        <div className="mt-4">{back}</div>
      </>
    );
  }
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <p className="mb-3 text-pencil">A link to choose a new password is sent to the address of your account.</p>
      <Field
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...register('email')}
      />
      {errors.root?.message === undefined ? null : (
        <Notice kind="alarm" className="mb-3">
          {errors.root.message}
        </Notice>
      )}
      <div className="mt-4 flex flex-wrap items-center justify-between gap-3">
        <Button look="main" type="submit" busy={isSubmitting && 'Asking …'}>
          Send me a link
        </Button>
        {back}
      </div>
    </form>
  );
}
