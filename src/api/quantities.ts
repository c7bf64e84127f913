import { mutationOptions, type QueryClient, queryOptions } from '@tanstack/react-query';
import * as api from '#shared/api/quantities.ts';
import type { QuantityInput } from '#shared/api/quantities.ts';
import { call } from './call.ts';
import { everyItem } from './every-item.ts';
import { manualKeys } from './manuals.ts';
import { quantityKeys } from './quantity-keys.ts';

export type Inputs = Record<string, number | string>;
export type Pin = { symbol: string; value: number | string; solveFor: string };

export const quantitiesOfManual = (manualId: string) =>
  queryOptions({
    queryKey: quantityKeys.list(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listQuantities, { params: { manualId }, query, signal })),
  });

export const proofOfManual = (manualId: string) =>
  queryOptions({
    queryKey: quantityKeys.proof(manualId),
    queryFn: ({ signal }) => call(api.getProof, { params: { manualId }, signal }),
  });

/** Every value at a setting; inputs that are left out stay at home. */
export const valuesAt = (manualId: string, inputs: Inputs = {}, pin?: Pin) =>
  queryOptions({
    queryKey: quantityKeys.evaluatedAt(manualId, pin === undefined ? { inputs } : { inputs, pin }),
    queryFn: ({ signal }) =>
      call(api.evaluateManual, {
        params: { manualId },
        body: pin === undefined ? { inputs } : { inputs, pin },
        signal,
      }),
  });

export const settingsOfManual = (manualId: string) =>
  queryOptions({
    queryKey: quantityKeys.settings(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(api.listSettings, { params: { manualId }, query, signal })),
  });

async function quantitiesChanged(client: QueryClient, manualId: string): Promise<void> {
  await client.invalidateQueries({ queryKey: quantityKeys.ofManual(manualId) });
  await client.invalidateQueries({ queryKey: manualKeys.one(manualId) });
}

export const addQuantity = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: QuantityInput) => call(api.createQuantity, { params: { manualId }, body }),
    onSuccess: () => quantitiesChanged(client, manualId),
  });

export const changeQuantity = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: ({ quantityId, change }: { quantityId: string; change: Record<string, unknown> }) =>
      call(api.updateQuantity, { params: { manualId, quantityId }, body: change }),
    onSuccess: () => quantitiesChanged(client, manualId),
  });

export const deleteQuantity = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (quantityId: string) => call(api.deleteQuantity, { params: { manualId, quantityId } }),
    onSuccess: () => quantitiesChanged(client, manualId),
  });

export const saveSetting = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (body: { name: string; inputs: Inputs }) => call(api.saveSetting, { params: { manualId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: quantityKeys.settings(manualId) }),
  });

export const deleteSetting = (client: QueryClient, manualId: string) =>
  mutationOptions({
    mutationFn: (settingId: string) => call(api.deleteSetting, { params: { manualId, settingId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: quantityKeys.settings(manualId) }),
  });
