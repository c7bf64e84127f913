import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import * as api from '#shared/api/people.ts';
import { call } from './call.ts';
import { everyItem } from './every-item.ts';

export const peopleKeys = { all: ['people'] as const };

export const everybody = queryOptions({
  queryKey: peopleKeys.all,
  queryFn: ({ signal }) => everyItem((query) => call(api.listPeople, { query, signal })),
});

const stale = (client: QueryClient) => () => client.invalidateQueries({ queryKey: peopleKeys.all });

export const invitePerson = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (body: z.input<typeof api.invite>) => call(api.invitePerson, { body }),
    onSuccess: stale(client),
  });

export type PersonChange = z.input<(typeof api.updatePerson)['body']>;

export const changePerson = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ personId, change }: { personId: string; change: PersonChange }) =>
      call(api.updatePerson, { params: { personId }, body: change }),
    onSuccess: stale(client),
  });

export const inviteAgain = mutationOptions({
  mutationFn: (personId: string) => call(api.inviteAgain, { params: { personId } }),
});
