import { listPresence } from '#shared/api/presence.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import type { Presence } from './presence.ts';

export function coeditingRoutes(api: ApiRouter, { db, presence }: Pick<Tools, 'db'> & { presence: Presence }): void {
  serve(api, listPresence, ({ params }) => {
    existingManual(db, params.manualId);
    return { items: presence.ofManual(params.manualId), nextCursor: null };
  });
}
