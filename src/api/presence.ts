import { queryOptions } from '@tanstack/react-query';
import { type PagePresence, listPresence } from '#shared/api/presence.ts';
import { call } from './call.ts';

export const presenceKey = (manualId: string) => ['presence', manualId] as const;

/** Who has which pages of a manual open to correct them; kept true by the live events. */
export const presenceIn = (manualId: string) =>
  queryOptions({
    queryKey: presenceKey(manualId),
    queryFn: async ({ signal }) => (await call(listPresence, { params: { manualId }, signal })).items,
  });

/** What is known, with what is told of one page. */
export function withPresence(
  known: readonly PagePresence[] | undefined,
  { pageId, people }: PagePresence,
): PagePresence[] | undefined {
  if (known === undefined) return undefined;
  const others = known.filter((each) => each.pageId !== pageId);
  return people.length === 0 ? others : [...others, { pageId, people }];
}
