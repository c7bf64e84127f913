import { queryOptions } from '@tanstack/react-query';
import { listParts } from '#shared/api/parts.ts';
import { addressOf, call } from './call.ts';
import { everyItem } from './every-item.ts';
import { partKeys } from './part-keys.ts';

export const partsOfManual = (manualId: string) =>
  queryOptions({
    queryKey: partKeys.ofManual(manualId),
    queryFn: ({ signal }) => everyItem((query) => call(listParts, { params: { manualId }, query, signal })),
  });

export const partsAsCsv = (manualId: string): string =>
  addressOf(listParts, { params: { manualId }, query: { format: 'csv' } });
