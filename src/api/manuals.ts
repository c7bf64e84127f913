import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/manuals.ts';
import type { Manual, ManualInput } from '#shared/api/manuals.ts';
import { call } from './call.ts';
import { everyItem } from './every-item.ts';
import { pageKeys } from './page-keys.ts';

export const manualKeys = {
  all: ['manuals'] as const,
  lists: ['manuals', 'list'] as const,
  list: (isBin: boolean) => ['manuals', 'list', isBin ? 'bin' : 'shelf'] as const,
  one: (manualId: string) => ['manuals', 'one', manualId] as const,
};

const listOf = (isBin: boolean) =>
  queryOptions({
    queryKey: manualKeys.list(isBin),
    queryFn: ({ signal }) =>
      everyItem((cursor) => call(api.listManuals, { query: { bin: isBin ? 'true' : 'false', ...cursor }, signal })),
  });

export const manualsOnShelf = listOf(false);
export const manualsInBin = listOf(true);

export const oneManual = (manualId: string) =>
  queryOptions({
    queryKey: manualKeys.one(manualId),
    queryFn: ({ signal }) => call(api.getManual, { params: { manualId }, signal }),
  });

/** Puts a changed manual where screens look for it. */
function keep(client: QueryClient, manual: Manual): Promise<void> {
  client.setQueryData(manualKeys.one(manual.id), manual);
  return client.invalidateQueries({ queryKey: manualKeys.lists });
}

export const addManual = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (body: ManualInput) => call(api.createManual, { body }),
    onSuccess: (manual) => keep(client, manual),
  });

export const changeManual = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: Partial<ManualInput & Pick<Manual, 'learns' | 'ownUnits'>>) =>
      call(api.updateManual, { params: { manualId }, body }),
    onSuccess: (manual) => keep(client, manual),
  });

export const binManual = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (manualId: string) => call(api.deleteManual, { params: { manualId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: manualKeys.lists }),
  });

export const restoreManual = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (manualId: string) => call(api.restoreManual, { params: { manualId } }),
    onSuccess: (manual) => keep(client, manual),
  });

export type Steering = 'pause' | 'resume' | 'cancel' | 'retry';

export const steerReading = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (what: Steering) => call(api.steerReading, { params: { manualId }, body: { do: what } }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: manualKeys.one(manualId) });
      await client.invalidateQueries({ queryKey: pageKeys.ofManual(manualId) });
    },
  });
