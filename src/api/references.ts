import { queryOptions } from '@tanstack/react-query';
import { listOpenReferences, listTargets } from '#shared/api/references.ts';
import { call } from './call.ts';
import { partKeys } from './part-keys.ts';

/** Under the key of the parts: both follow from the documents of the manual's pages, and go stale together. */
export const targetsIn = (manualId: string) =>
  queryOptions({
    queryKey: [...partKeys.ofManual(manualId), 'targets'],
    queryFn: async ({ signal }) => (await call(listTargets, { params: { manualId }, signal })).items,
  });

export const openReferencesIn = (manualId: string) =>
  queryOptions({
    queryKey: [...partKeys.ofManual(manualId), 'open-references'],
    queryFn: async ({ signal }) => (await call(listOpenReferences, { params: { manualId }, signal })).items,
  });
