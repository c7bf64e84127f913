import { queryOptions } from '@tanstack/react-query';
import { listOutbox } from '#shared/api/outbox.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { call } from './call.ts';

/** The mails kept here; null where a real mail server is configured and nothing is kept. */
export const mailsKept = queryOptions({
  queryKey: ['outbox'] as const,
  queryFn: async ({ signal }) => {
    try {
      return (await call(listOutbox, { signal })).items;
    } catch (error) {
      if (error instanceof AppError && error.code === 'not-found') return null;
      throw error;
    }
  },
});
