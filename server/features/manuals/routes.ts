import path from 'node:path';
import { pipeline } from 'node:stream/promises';
import * as manualApi from '#shared/api/manuals.ts';
import * as sourceApi from '#shared/api/sources.ts';
import { AppError } from '#shared/kit/app-error.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve, serveRaw } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { findSource, manualRows, sourceReply, sourceRows, withCounts } from './queries.ts';
import { binManual, createManual, existingManual, manualReply, restoreManual, updateManual } from './service.ts';
import { type AddPages, sourceKey, takeIn } from './sources.ts';
import { receiveFiles } from './upload.ts';

export function manualRoutes(api: ApiRouter, tools: Tools & { sideWorker: SideWorker; addPages: AddPages }): void {
  const { db } = tools;
  serve(api, manualApi.listManuals, ({ query }) => {
    const rows = manualRows(db, query.bin, { limit: query.limit + 1, offset: offsetOf(query) });
    return pageOfList(withCounts(db, rows), query);
  });
  serve(api, manualApi.createManual, ({ user, body }) => createManual(tools, user, body));
  serve(api, manualApi.getManual, ({ params }) => manualReply(db, existingManual(db, params.manualId).id));
  serve(api, manualApi.updateManual, ({ user, params, body }) =>
    updateManual(tools, user, { ...params, change: body }),
  );
  serve(api, manualApi.deleteManual, ({ user, params }) => {
    binManual(tools, user, params.manualId);
    return { ok: true as const };
  });
  serve(api, manualApi.restoreManual, ({ user, params }) => restoreManual(tools, user, params.manualId));
  sourceRoutes(api, tools);
}

function sourceRoutes(api: ApiRouter, tools: Tools & { sideWorker: SideWorker; addPages: AddPages }): void {
  const { db, config, files } = tools;
  const receive = receiveFiles(path.join(config.dataDir, 'incoming'), config.limits.uploadBytes);
  serve(api, sourceApi.listSources, ({ params, query }) => {
    existingManual(db, params.manualId);
    const rows = sourceRows(db, params.manualId, { limit: query.limit + 1, offset: offsetOf(query) });
    return pageOfList(rows.map(sourceReply), query);
  });
  serve(api, sourceApi.uploadSources, async ({ user, params, request, response }) => {
    existingManual(db, params.manualId);
    const arrived = await receive(request, response);
    return { items: await takeIn(tools, user, { ...params, files: arrived }) };
  });
  serveRaw(api, sourceApi.downloadSource, async ({ params, response }) => {
    const source = findSource(db, params.sourceId);
    if (source === undefined) throw new AppError('not-found', 'There is no such source.');
    existingManual(db, source.manualId);
    response.attachment(source.fileName).type(source.mediaType).set('Content-Length', String(source.bytes));
    await pipeline(await files.read(sourceKey(source.sha256)), response);
  });
}
