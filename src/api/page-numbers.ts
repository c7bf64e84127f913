import { queryOptions } from '@tanstack/react-query';
import { getPageNumbers } from '#shared/api/page-numbers.ts';
import { call } from './call.ts';
import { partKeys } from './part-keys.ts';

export const pageNumbersIn = (manualId: string) =>
  queryOptions({
    queryKey: [...partKeys.ofManual(manualId), 'page-numbers'],
    queryFn: ({ signal }) => call(getPageNumbers, { params: { manualId }, signal }),
  });
