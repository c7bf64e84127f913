import { queryOptions, useQuery } from '@tanstack/react-query';
import { type Action, can } from '#shared/access/roles.ts';
import { getMe } from '#shared/api/people.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { call, unreachable } from './call.ts';

export const sessionKeys = { me: ['me'] as const };

/** Who is signed in; null when nobody is. */
export const me = queryOptions({
  queryKey: sessionKeys.me,
  queryFn: async ({ signal }) => {
    try {
      return await call(getMe, { signal });
    } catch (error) {
      if (error instanceof AppError && error.code === 'not-signed-in') return null;
      throw error;
    }
  },
  staleTime: 5 * 60_000,
});

/** Whether the person who is signed in may do this. False until it is known. */
export function useCan(action: Action): boolean {
  const { data } = useQuery(me);
  return data !== undefined && data !== null && can(data.role, action);
}

const refused: Record<string, string> = {
  INVALID_EMAIL_OR_PASSWORD: 'This e-mail address and password do not go together. Check both.',
  INVALID_EMAIL: 'This is not an e-mail address.',
  INVALID_TOKEN: 'This link has been used or has run out. Ask for a new one.',
  PASSWORD_TOO_SHORT: 'A password needs at least 10 characters.',
  PASSWORD_TOO_LONG: 'This password is too long. 128 characters are the most.',
  BANNED_USER: 'This account is barred. Ask an administrator.',
};

/** The sign-in library's own routes answer in its own form: a code and a message. */
async function ask(path: string, body: object): Promise<void> {
  const response = await fetch(`/api/auth/${path}`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify(body),
  }).catch(() => {
    throw unreachable();
  });
  if (response.ok) return;
  if (response.status === 429)
    throw new AppError('too-many-requests', 'Too many tries. Wait a minute, then try again.');
  if (response.status >= 500) throw unreachable();
  const { code, message } = (await response.json().catch(() => ({}))) as { code?: string; message?: string };
  throw new AppError('cannot-do', refused[code ?? ''] ?? message ?? 'This was refused. Try again.');
}

export const signIn = (given: { email: string; password: string }): Promise<void> => ask('sign-in/email', given);
export const signOut = (): Promise<void> => ask('sign-out', {});
/** Answers the same whether or not there is such an account. */
export const askForPasswordLink = (given: { email: string }): Promise<void> => ask('request-password-reset', given);
export const setPassword = (given: { newPassword: string; token: string }): Promise<void> =>
  ask('reset-password', given);
