import { infiniteQueryOptions } from '@tanstack/react-query';
import { listAudit } from '#shared/api/audit.ts';
import { call } from './call.ts';

const pageLength = 100;

export const auditTrail = infiniteQueryOptions({
  queryKey: ['audit'] as const,
  queryFn: ({ signal, pageParam }) =>
    call(listAudit, { query: { limit: pageLength, ...(pageParam === null ? {} : { cursor: pageParam }) }, signal }),
  initialPageParam: null as string | null,
  getNextPageParam: ({ nextCursor }) => nextCursor,
});
