import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import * as api from '#shared/api/comments.ts';
import { listNames } from '#shared/api/people.ts';
import { call } from './call.ts';
import { commentKeys } from './comment-keys.ts';
import { everyItem } from './every-item.ts';

export const commentsOfPage = (pageId: string) =>
  queryOptions({
    queryKey: commentKeys.ofPage(pageId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listPageComments, { params: { pageId }, query, signal })),
  });

/** What nobody has resolved yet, over all pages of a manual. */
export const openComments = (manualId: string) =>
  queryOptions({
    queryKey: commentKeys.openIn(manualId),
    queryFn: ({ signal }) =>
      everyItem((query) =>
        call(api.listManualComments, { params: { manualId }, query: { ...query, open: 'true' }, signal }),
      ),
  });

/** Who can be mentioned; names come and go seldom. */
export const everyName = queryOptions({
  queryKey: ['people', 'names'] as const,
  queryFn: ({ signal }) => everyItem((query) => call(listNames, { query, signal })),
  staleTime: 5 * 60_000,
});

const stale = (client: QueryClient, pageId: string) => () =>
  client.invalidateQueries({ queryKey: commentKeys.ofPage(pageId) });

export type Said = { words: string; mentions: string[] };

export const addComment = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: (body: z.input<typeof api.createComment.body>) => call(api.createComment, { params: { pageId }, body }),
    onSuccess: stale(client, pageId),
  });

export const addReply = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: ({ commentId, ...body }: Said & { commentId: string }) =>
      call(api.replyToComment, { params: { commentId }, body }),
    onSuccess: stale(client, pageId),
  });

export const changeComment = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: ({ commentId, ...body }: Said & { commentId: string }) =>
      call(api.changeComment, { params: { commentId }, body }),
    onSuccess: stale(client, pageId),
  });

export const resolveComment = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: ({ commentId, resolved }: { commentId: string; resolved: boolean }) =>
      call(api.resolveComment, { params: { commentId }, body: { resolved } }),
    onSuccess: stale(client, pageId),
  });

export const deleteComment = (client: QueryClient, pageId: string) =>
  mutationOptions({
    mutationFn: (commentId: string) => call(api.deleteComment, { params: { commentId } }),
    onSuccess: stale(client, pageId),
  });
