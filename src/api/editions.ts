import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/editions.ts';
import { call } from './call.ts';
import { editionKeys } from './edition-keys.ts';
import { everyItem } from './every-item.ts';

export const editionsOfManual = (manualId: string) =>
  queryOptions({
    queryKey: editionKeys.list(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listEditions, { params: { manualId }, query, signal })),
  });

export const oneEdition = (manualId: string, number: number) =>
  queryOptions({
    queryKey: editionKeys.one(manualId, number),
    queryFn: ({ signal }) => call(api.getEdition, { params: { manualId, number }, signal }),
  });

export const pageOfEdition = (manualId: string, number: number, pageId: string) =>
  queryOptions({
    queryKey: editionKeys.page(manualId, number, pageId),
    queryFn: ({ signal }) => call(api.getEditionPage, { params: { manualId, number, pageId }, signal }),
  });

export const valuesOfEdition = (manualId: string, number: number) =>
  queryOptions({
    queryKey: editionKeys.values(manualId, number),
    queryFn: ({ signal }) => call(api.getEditionValues, { params: { manualId, number }, signal }),
    staleTime: Infinity,
  });

/** What publishing now would make. Asked anew each time: anybody may be correcting pages meanwhile. */
export const editionDraft = (manualId: string) =>
  queryOptions({
    queryKey: editionKeys.draft(manualId),
    queryFn: ({ signal }) => call(api.getEditionDraft, { params: { manualId }, signal }),
    staleTime: 0,
  });

export const differenceOfEditions = (manualId: string, from: number, to: number | 'work') =>
  queryOptions({
    queryKey: to === 'work' ? editionKeys.sinceEdition(manualId, from) : editionKeys.between(manualId, from, to),
    queryFn: ({ signal }) =>
      call(api.getEditionDifference, { params: { manualId, number: from }, query: { to }, signal }),
    ...(to === 'work' ? { staleTime: 0 } : {}),
  });

const stale = (client: QueryClient, manualId: string) => () =>
  client.invalidateQueries({ queryKey: editionKeys.ofManual(manualId) });

export const publishEdition = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: { number: number; name: string; note: string }) =>
      call(api.publishEdition, { params: { manualId }, body }),
    onSettled: stale(client, manualId),
  });

export const withdrawEdition = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: ({ number, reason }: { number: number; reason: string }) =>
      call(api.withdrawEdition, { params: { manualId, number }, body: { reason } }),
    onSettled: stale(client, manualId),
  });
