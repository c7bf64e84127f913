import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { signIn } from '#src/api/session.ts';
import { saidBy } from '#src/lib/said-by.ts';
import { Button } from '#src/ui/button.tsx';
import { Field } from '#src/ui/field.tsx';
import { Notice } from '#src/ui/notice.tsx';
import { DemoAccounts, isDemo } from './demo-accounts.tsx';

const account = z.object({
  email: z.email('Give the e-mail address of your account.'),
  password: z.string().min(1, 'Give your password.'),
});
type Account = z.infer<typeof account>;

type Props = { onSignedIn: () => void | Promise<void>; onForgotten: () => void };

export function SignInForm({ onSignedIn, onForgotten }: Props) {
  const { register, handleSubmit, setValue, setError, formState } = useForm<Account>({
    resolver: zodResolver(account),
    defaultValues: { email: '', password: '' },
  });
  const submit = handleSubmit(async (given) => {
    try {
      await signIn(given);
      await onSignedIn();
    } catch (error) {
      setError('root', { message: saidBy(error) });
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Field
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...register('email')}
      />
      <Field
        label="Password"
        type="password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...register('password')}
      />
      {errors.root?.message === undefined ? null : (
        <Notice kind="alarm" className="mb-3">
          {errors.root.message}
        </Notice>
      )}
      <div className="mt-4 flex flex-wrap items-center justify-between gap-3">
        <Button look="main" type="submit" busy={isSubmitting && 'Signing in …'}>
          Sign in
        </Button>
        <Button look="quiet" onClick={onForgotten}>
          Forgotten?
        </Button>
      </div>
      {isDemo() ? (
        <DemoAccounts
          onChoose={({ email, password }) => {
            setValue('email', email, { shouldValidate: true });
            setValue('password', password, { shouldValidate: true });
          }}
        />
      ) : null}
    </form>
  );
}
