import { mutationOptions } from '@tanstack/react-query';
import * as api from '#shared/api/zone-readings.ts';
import type { Zone } from '#shared/document/define-block.ts';
import { call } from './call.ts';

export const readZone = (pageId: string) =>
  mutationOptions({
    mutationFn: ({ zone, as }: { zone: Zone; as: api.ZoneKind }) =>
      call(api.readZone, { params: { pageId }, body: { zone, as } }),
  });
