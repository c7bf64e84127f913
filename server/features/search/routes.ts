import { search } from '#shared/api/search.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { findAll } from './service.ts';

export function searchRoutes(api: ApiRouter, tools: Tools): void {
  serve(api, search, ({ query }) => {
    const offset = offsetOf(query);
    const { hits, close } = findAll(tools, query, offset + query.limit + 1);
    return { ...pageOfList(hits.slice(offset), query), close };
  });
}
