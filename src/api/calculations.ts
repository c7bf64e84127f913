import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/calculations.ts';
import type { z } from 'zod';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import { addressOf, call } from './call.ts';
import type { Inputs } from './quantities.ts';
import { quantityKeys } from './quantity-keys.ts';

export const channelTablesOfManual = (manualId: string) =>
  queryOptions({
    queryKey: [...quantityKeys.ofManual(manualId), 'channel-tables'],
    queryFn: ({ signal }) => call(api.listChannelTables, { params: { manualId }, signal }).then(({ items }) => items),
  });

export const planOfManual = (manualId: string) =>
  queryOptions({
    queryKey: [...quantityKeys.ofManual(manualId), 'frequency-plan'],
    queryFn: ({ signal }) => call(api.getFrequencyPlan, { params: { manualId }, signal }),
  });

export const savePlan = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: { baseNumber: number; plan: FrequencyPlan }) =>
      call(api.saveFrequencyPlan, { params: { manualId }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: quantityKeys.ofManual(manualId) }),
  });

type Between = { before: Inputs; after: Inputs };

export const changeSheetOf = (manualId: string, between: Between) =>
  queryOptions({
    queryKey: [...quantityKeys.ofManual(manualId), 'change-sheet', between],
    queryFn: ({ signal }) => call(api.getChangeSheet, { params: { manualId }, body: between, signal }),
  });

/** The same as a file. It is asked for with the settings in the request's body, so a plain link does not do. */
export const changeSheetFile = (manualId: string) =>
  mutationOptions({
    mutationFn: async (between: Between): Promise<Blob> => {
      const response = await fetch(addressOf(api.getChangeSheet, { params: { manualId }, query: { format: 'csv' } }), {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify(between),
      });
      if (!response.ok) throw new Error('The change sheet could not be written to a file. Try again.');
      return response.blob();
    },
  });

/** Looking takes a moment, so it is done when asked for and kept. */
export const relationsOf = (manualId: string) =>
  queryOptions({
    queryKey: ['relations', manualId],
    queryFn: ({ signal }) => call(api.findRelations, { params: { manualId }, signal }),
    enabled: false,
    staleTime: Infinity,
  });

type Found = z.infer<typeof api.findRelations.reply>;

export const judgeRelation = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: { relation: string; verdict: 'accepted' | 'dismissed' }) =>
      call(api.judgeRelation, { params: { manualId }, body }),
    onSuccess: (_reply, { relation }) => {
      client.setQueryData(relationsOf(manualId).queryKey, (found: Found | undefined) =>
        found === undefined ? undefined : { ...found, items: found.items.filter(({ filled }) => filled !== relation) },
      );
    },
  });
