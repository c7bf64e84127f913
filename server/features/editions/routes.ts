import * as api from '#shared/api/editions.ts';
import { channelTablesOf } from '#shared/document/channel-tables.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { documentOfPage } from '#server/features/revisions/index.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { differenceBetween } from './difference.ts';
import { editionReply, editionRows, existingEdition, pagesOfEdition } from './queries.ts';
import { draftOf, pageOfEdition, publish, withdraw } from './service.ts';

export function editionRoutes(router: ApiRouter, tools: Tools): void {
  const { db } = tools;
  serve(router, api.listEditions, ({ params, query }) => {
    existingManual(db, params.manualId);
    const offset = offsetOf(query);
    const rows = editionRows(db, params.manualId).slice(offset, offset + query.limit + 1);
    return pageOfList(
      rows.map((row) => editionReply(db, row)),
      query,
    );
  });
  serve(router, api.getEditionDraft, ({ params }) => {
    existingManual(db, params.manualId);
    return draftOf(db, params.manualId);
  });
  serve(router, api.publishEdition, ({ user, params, body }) => publish(tools, user, { ...params, ...body }));
  serve(router, api.withdrawEdition, ({ user, params, body }) => withdraw(tools, user, { ...params, ...body }));
  contentRoutes(router, tools);
}

/** What stands in an edition. */
function contentRoutes(router: ApiRouter, { db }: Tools): void {
  const editionOf = ({ manualId, number }: { manualId: string; number: number }) => {
    existingManual(db, manualId);
    return existingEdition(db, manualId, number);
  };
  serve(router, api.getEdition, ({ params }) => {
    const row = editionOf(params);
    return { ...editionReply(db, row), pages: pagesOfEdition(db, row.id) };
  });
  serve(router, api.getEditionDifference, ({ params, query }) => {
    editionOf(params);
    return differenceBetween(db, { ...params, ...query });
  });
  serve(router, api.getEditionPage, ({ params }) => {
    editionOf(params);
    return pageOfEdition(db, params);
  });
  serve(router, api.getEditionValues, ({ params }) => {
    const { id, quantities, plan } = editionOf(params);
    return { quantities, plan, tables: tablesIn(id) };
  });
  const tablesIn = (editionId: string) => {
    const tables = pagesOfEdition(db, editionId).flatMap(({ pageId, label, revision }) => {
      const document = documentOfPage(db, pageId, revision);
      return document === null ? [] : channelTablesOf(document, label).map((table) => ({ ...table, pageId }));
    });
    // Of two with one name the first counts.
    return [...new Map([...tables].reverse().map((table) => [table.id, table])).values()]
      .reverse()
      .map((table) => ({ ...table, rows: table.rows.map((row) => [...row]) }));
  };
}
