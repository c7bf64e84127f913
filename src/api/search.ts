import { infiniteQueryOptions, keepPreviousData } from '@tanstack/react-query';
import * as api from '#shared/api/search.ts';
import { call } from './call.ts';

export type Wanted = { q: string; manualId?: string; kind?: (typeof api.searchKinds)[number] };

export const searchKeys = { of: (wanted: Wanted) => ['search', wanted] as const };

export const searchFor = (wanted: Wanted) =>
  infiniteQueryOptions({
    queryKey: searchKeys.of(wanted),
    queryFn: ({ signal, pageParam }) =>
      call(api.search, { query: { ...wanted, ...(pageParam === null ? {} : { cursor: pageParam }) }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: ({ nextCursor }) => nextCursor,
    enabled: wanted.q.trim() !== '',
    placeholderData: keepPreviousData,
  });
