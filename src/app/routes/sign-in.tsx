import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Navigate, useNavigate, useSearchParams } from 'react-router';
import { me } from '#src/api/session.ts';
import { Door } from '#src/features/session/door.tsx';
import { ForgottenForm } from '#src/features/session/forgotten-form.tsx';
import { SignInForm } from '#src/features/session/sign-in-form.tsx';
import { backAddress } from '#src/lib/back-address.ts';
import { useTitle } from '#src/lib/use-title.ts';

export function Component() {
  const [asked] = useSearchParams();
  const back = backAddress(asked.get('back'));
  const [hasForgotten, setForgotten] = useState(false);
  const client = useQueryClient();
  const navigate = useNavigate();
  const { data: person } = useQuery(me);
  useTitle('Sign in');
  if (person !== undefined && person !== null) return <Navigate to={back} replace />;
  const enter = async (): Promise<void> => {
    await client.fetchQuery({ ...me, staleTime: 0 });
    await navigate(back, { replace: true });
  };
  return hasForgotten ? (
    <Door title="A new password">
      <ForgottenForm onBack={() => setForgotten(false)} />
    </Door>
  ) : (
    <Door title="Sign in">
      <SignInForm onSignedIn={enter} onForgotten={() => setForgotten(true)} />
    </Door>
  );
}
