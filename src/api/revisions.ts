import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/revisions.ts';
import { call } from './call.ts';
import { everyItem } from './every-item.ts';
import { pageKeys } from './page-keys.ts';

type Place = [row: number, cell: number];
type Given = { number: number; baseRevision: number; block: string; cell?: { from: Place; to: Place } };

export const revisionsOfPage = (pageId: string) =>
  queryOptions({
    queryKey: pageKeys.revisions(pageId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listRevisions, { params: { pageId }, query, signal })),
  });

/** A revision never changes, so it is fetched once. */
export const oneRevision = (pageId: string, number: number) =>
  queryOptions({
    queryKey: pageKeys.revision(pageId, number),
    queryFn: ({ signal }) => call(api.getRevision, { params: { pageId, number }, signal }),
    staleTime: Infinity,
  });

export const saveTogether = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: (body: { note?: string }) => call(api.saveTogether, { params: { pageId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: pageKeys.one(pageId) }),
  });

export const restoreRevision = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: ({ number, note }: { number: number; note?: string }) =>
      call(api.restoreRevision, { params: { pageId, number }, body: note === undefined ? {} : { note } }),
    onSuccess: () => client.invalidateQueries({ queryKey: pageKeys.one(pageId) }),
  });

/** A page changes for everybody who looks at it when it is signed; what the server answers is shown at once. */
export const signPage = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: (body: { revision: number; doubts: number }) => call(api.signPage, { params: { pageId }, body }),
    onSuccess: (page) => client.setQueryData(pageKeys.one(pageId), page),
    onError: () => client.invalidateQueries({ queryKey: pageKeys.one(pageId) }),
  });

export const takeBackSignature = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: () => call(api.takeBackSignature, { params: { pageId } }),
    onSuccess: (page) => client.setQueryData(pageKeys.one(pageId), page),
    onError: () => client.invalidateQueries({ queryKey: pageKeys.one(pageId) }),
  });

export const restorePart = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: ({ number, ...body }: Given) => call(api.restorePart, { params: { pageId, number }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: pageKeys.one(pageId) }),
  });

export const authorsOfPage = (pageId: string) =>
  queryOptions({
    queryKey: pageKeys.authors(pageId),
    queryFn: ({ signal }) => call(api.listBlockAuthors, { params: { pageId }, signal }).then(({ items }) => items),
  });
