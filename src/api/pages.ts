import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/pages.ts';
import type { PageSummary } from '#shared/api/pages.ts';
import type { Zone } from '#shared/document/define-block.ts';
import type { RecipeWish } from '#shared/reading/reading.ts';
import { addressOf, call } from './call.ts';
import { everyItem } from './every-item.ts';
import { pageKeys } from './page-keys.ts';

export const pagesOfManual = (manualId: string) =>
  queryOptions({
    queryKey: pageKeys.ofManual(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listPages, { params: { manualId }, query, signal })),
  });

export const onePage = (pageId: string) =>
  queryOptions({
    queryKey: pageKeys.one(pageId),
    queryFn: ({ signal }) => call(api.getPage, { params: { pageId }, signal }),
  });

type Picture = { width?: number; zone?: Zone; v?: string };

/** The address of the picture of a page, or of one zone of it. */
export const imageOf = (pageId: string, { width, zone, v }: Picture = {}): string =>
  addressOf(api.getPageImage, {
    params: { pageId },
    query: {
      ...(width === undefined ? {} : { width }),
      ...(zone === undefined ? {} : { zone: zone.map((each) => Math.max(0, Math.round(each))).join(',') }),
      ...(v === undefined ? {} : { v }),
    },
  });

/** Puts one page's new summary into the list it stands in, and says that the page itself is stale. */
export function keepSummary(client: QueryClient, manualId: string, summary: PageSummary): void {
  client.setQueryData(pageKeys.ofManual(manualId), (pages: PageSummary[] | undefined) =>
    pages?.map((page) => (page.id === summary.id ? summary : page)),
  );
}

export const relabelPage = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: ({ pageId, label }: { pageId: string; label: string }) =>
      call(api.updatePage, { params: { pageId }, body: { label } }),
    onSuccess: (summary) => {
      keepSummary(client, manualId, summary);
      return client.invalidateQueries({ queryKey: pageKeys.one(summary.id) });
    },
  });

export const readPageAgain = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: ({ pageId, recipe }: { pageId: string; recipe?: RecipeWish }) =>
      call(api.readAgain, { params: { pageId }, body: recipe === undefined ? {} : { recipe } }),
    onSuccess: (summary) => {
      keepSummary(client, manualId, summary);
      return client.invalidateQueries({ queryKey: pageKeys.one(summary.id) });
    },
  });

/** Somebody looks at this page: the server reads it before others. Failing is of no matter. */
export const lookAtPage = (pageId: string): Promise<unknown> =>
  call(api.lookAtPage, { params: { pageId } }).catch(() => undefined);

export const readingOfPage = (pageId: string) =>
  queryOptions({
    queryKey: pageKeys.reading(pageId),
    queryFn: ({ signal }) => call(api.getPageReading, { params: { pageId }, signal }),
  });

/** Pages come and go with a division, so the whole list is stale. */
const staleList = (client: QueryClient, manualId: string) => () =>
  client.invalidateQueries({ queryKey: pageKeys.ofManual(manualId) });

export const dividePage = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: ({ pageId, cutShare }: { pageId: string; cutShare: number }) =>
      call(api.dividePage, { params: { pageId }, body: { cutShare } }),
    onSuccess: staleList(client, manualId),
  });

export const joinPage = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (pageId: string) => call(api.joinPage, { params: { pageId } }),
    onSuccess: staleList(client, manualId),
  });
