import * as manualApi from '#shared/api/manuals.ts';
import * as pageApi from '#shared/api/pages.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve, serveRaw } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { dividePage, joinPage } from './division.ts';
import { sendImage } from './image.ts';
import { newestReading, pageRows, pageSummary } from './queries.ts';
import { attend, existingPage, readAgain, relabel, steerReading } from './service.ts';

export function pageRoutes(api: ApiRouter, tools: Tools): void {
  const { db } = tools;
  serve(api, pageApi.listPages, ({ params, query }) => {
    existingManual(db, params.manualId);
    const rows = pageRows(db, params.manualId, { limit: query.limit + 1, offset: offsetOf(query) });
    return pageOfList(rows.map(pageSummary), query);
  });
  serve(api, pageApi.updatePage, ({ user, params, body }) => relabel(tools, user, { ...params, ...body }));
  serveRaw(api, pageApi.getPageImage, ({ params, query, response }) =>
    sendImage(tools, existingPage(db, params.pageId), { wanted: query, response }),
  );
  serve(api, pageApi.getPageReading, ({ params }) => {
    const page = existingPage(db, params.pageId);
    const reading = newestReading(db, page);
    if (reading === undefined) throw new AppError('not-found', 'This page has not been read yet.');
    const { figures, ...content } = reading.content;
    const blocks = figures.map((box) => ({ kind: 'figure', box }));
    return { ...content, id: String(reading.id), blocks, createdAt: reading.createdAt.toISOString() };
  });
  serve(api, pageApi.readAgain, ({ user, params, body }) => readAgain(tools, user, { ...params, wish: body?.recipe }));
  serve(api, pageApi.dividePage, ({ user, params, body }) => ({
    items: dividePage(tools, user, { ...params, cutShare: body?.cutShare ?? 0.5 }),
  }));
  serve(api, pageApi.joinPage, ({ user, params }) => joinPage(tools, user, params.pageId));
  serve(api, pageApi.lookAtPage, ({ params }) => {
    attend(tools, params.pageId);
    return { ok: true as const };
  });
  serve(api, manualApi.steerReading, ({ user, params, body }) =>
    steerReading(tools, user, { ...params, what: body.do }),
  );
}
