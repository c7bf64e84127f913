import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { setPassword } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Field } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';

/** The same least length as the server's. */
export const leastLetters = 10;

const twice = z
  .object({
    newPassword: z
      .string()
      .min(leastLetters, `At least ${leastLetters} characters.`)
      .max(128, 'At most 128 characters.'),
    again: z.string(),
  })
  .refine(({ newPassword, again }) => newPassword === again, { path: ['again'], message: 'The two are not the same.' });

export function SetPasswordForm({ token, onSet }: { token: string; onSet: () => void }) {
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(twice),
    defaultValues: { newPassword: '', again: '' },
  });
  const submit = handleSubmit(async ({ newPassword }) => {
    try {
      await setPassword({ newPassword, token });
      onSet();
    } catch (error) {
      setError('root', { message: saidBy(error) });
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Field
        label="New password"
        type="password"
        autoComplete="new-password"
        hint={`At least ${leastLetters} characters. A few words in a row are easy to keep in mind.`}
        error={errors.newPassword?.message}
        {...register('newPassword')}
      />
      <Field
        label="The same again"
        type="password"
        autoComplete="new-password"
        error={errors.again?.message}
        {...register('again')}
      />
      {errors.root?.message === undefined ? null : (
        <Notice kind="alarm" className="mb-3">
          {errors.root.message}
        </Notice>
      )}
      <Button look="main" type="submit" className="mt-2" busy={isSubmitting && 'Keeping it …'}>
        Set this password
      </Button>
    </form>
  );
}
