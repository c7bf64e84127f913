import { stringify } from 'csv-stringify/sync';
import * as pageApi from '#shared/api/pages.ts';
import * as partApi from '#shared/api/parts.ts';
import * as revisionApi from '#shared/api/revisions.ts';
import { partsOfManual } from '#shared/document/parts-of-manual.ts';
import { tablesOf } from '#shared/document/tables.ts';
import { textOf } from '#shared/document/text-of.ts';
import { blockZones } from '#shared/document/zones.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { existingPage, pageSummary } from '#server/features/pages/index.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve, serveRaw } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { referenceRoutes } from './references.ts';
import { documentOfPage, documentsOfManual, findRevision, revisionRows } from './queries.ts';
import { restoreRevision, revisionReply, saveDocument, saveTogether } from './service.ts';

export function revisionRoutes(api: ApiRouter, tools: Tools): void {
  const { db } = tools;
  serve(api, revisionApi.listRevisions, ({ params, query }) => {
    existingPage(db, params.pageId);
    return pageOfList(revisionRows(db, params.pageId, { limit: query.limit + 1, offset: offsetOf(query) }), query);
  });
  serve(api, revisionApi.getRevision, ({ params }) => {
    existingPage(db, params.pageId);
    const row = findRevision(db, params.pageId, params.number);
    if (row === undefined) throw new AppError('not-found', `This page has no revision ${params.number}.`);
    return revisionReply(row);
  });
  serve(api, revisionApi.saveDocument, ({ user, params, body }) =>
    revisionReply(saveDocument(tools, user, { ...params, ...body, note: body.note ?? '' })),
  );
  serve(api, revisionApi.saveTogether, ({ user, params, body }) =>
    revisionReply(saveTogether(tools, user, { ...params, note: body?.note ?? '' })),
  );
  serve(api, revisionApi.restoreRevision, ({ user, params, body }) =>
    revisionReply(restoreRevision(tools, user, { ...params, note: body?.note ?? '' })),
  );
  documentRoutes(api, tools);
  partRoutes(api, tools);
  referenceRoutes(api, tools);
}

/** What there is to read on a page: the current document, as it is, as text and as tables. */
function documentRoutes(api: ApiRouter, { db }: Tools): void {
  const currentOf = (pageId: string) => {
    const page = existingPage(db, pageId);
    return { page, document: documentOfPage(db, page.id, page.revision) };
  };
  serve(api, pageApi.getPage, ({ params }) => {
    const { page, document } = currentOf(params.pageId);
    const { manualId, width, height } = page;
    return {
      ...pageSummary(page),
      manualId,
      width,
      height,
      document: document as Record<string, unknown> | null,
      zones: document === null ? [] : blockZones(document),
    };
  });
  serveRaw(api, pageApi.getPageText, ({ params, response }) => {
    const { document } = currentOf(params.pageId);
    response.type('text/plain').send(document === null ? '' : textOf(document));
  });
  serve(api, pageApi.getPageTables, ({ params }) => {
    const { document } = currentOf(params.pageId);
    return { items: document === null ? [] : tablesOf(document) };
  });
}

const csvColumns = [
  'refDes',
  'partNumber',
  'description',
  'quantity',
  'value',
  'unit',
  'tolerance',
  'page',
  'problems',
];

function partRoutes(api: ApiRouter, { db }: Tools): void {
  serveRaw(api, partApi.listParts, ({ params, query, response }) => {
    const manual = existingManual(db, params.manualId);
    const parts = partsOfManual(documentsOfManual(db, params.manualId));
    if (query.format === 'csv') {
      const rows = parts.map((part) => [
        ...[part.refDes, part.partNumber, part.description, part.quantity],
        ...[part.value?.magnitude ?? '', part.value?.unit ?? '', part.value?.tolerance ?? ''],
        ...[part.pageLabel, part.problems.join(' ')],
      ]);
      response.attachment(`${manual.documentNumber ?? manual.title} parts.csv`).type('text/csv');
      response.send(stringify([csvColumns, ...rows], { escape_formulas: true }));
      return;
    }
    const offset = offsetOf(query);
    response.json(partApi.listParts.reply.parse(pageOfList(parts.slice(offset, offset + query.limit + 1), query)));
  });
}
