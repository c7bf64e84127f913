import { QueryClient } from '@tanstack/react-query';
import { isWorthRetrying } from '#src/api/call.ts';

const mostTries = 2;
/** The live events say what went stale; this is for what they do not tell. */
const freshMs = 30_000;

export const queryClient = new QueryClient({
  defaultOptions: {
    queries: {
      staleTime: freshMs,
      retry: (failures, error) => failures < mostTries && isWorthRetrying(error),
    },
  },
});
