import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import * as api from '#shared/api/quantities.ts';
import { evaluate } from '#shared/calc/evaluate.ts';
import { proof } from '#shared/calc/proof.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { settings } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { offsetOf, pageOfList } from '#server/http/lists.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { findSetting, quantityReply, quantityRows, settingRows } from './queries.ts';
import { calculationSheetRoutes } from './calculations.ts';
import { planRoutes } from './plan.ts';
import { relationRoutes } from './relations.ts';
import { createQuantity, deleteQuantity, programOf, updateQuantity } from './service.ts';

export function valueRoutes(router: ApiRouter, tools: Tools & { sideWorker: SideWorker }): void {
  const { db } = tools;
  serve(router, api.listQuantities, ({ params, query }) => {
    existingManual(db, params.manualId);
    const offset = offsetOf(query);
    return pageOfList(
      quantityRows(db, params.manualId)
        .slice(offset, offset + query.limit + 1)
        .map(quantityReply),
      query,
    );
  });
  serve(router, api.createQuantity, ({ user, params, body }) =>
    createQuantity(tools, user, { ...params, given: body }),
  );
  serve(router, api.updateQuantity, ({ user, params, body }) =>
    updateQuantity(tools, user, { ...params, change: body }),
  );
  serve(router, api.deleteQuantity, ({ user, params }) => {
    deleteQuantity(tools, user, params);
    return { ok: true as const };
  });
  calculationRoutes(router, tools);
  calculationSheetRoutes(router, tools);
  planRoutes(router, tools);
  relationRoutes(router, tools);
  settingRoutes(router, tools);
}

function calculationRoutes(router: ApiRouter, { db }: Tools): void {
  serve(router, api.evaluateManual, ({ params, body }) => {
    const program = programOf(db, params.manualId);
    const unknown = Object.keys(body.inputs).find((symbol) => !program.slots.has(symbol));
    if (unknown !== undefined) throw new AppError('cannot-do', `This manual has no quantity called ${unknown}.`);
    const { values, setting, problems } = evaluate(program, body.inputs, {
      pin: body.pin,
      tolerances: true,
      sensitivities: true,
    });
    return { values, setting, problems };
  });
  serve(router, api.getProof, ({ params }) => {
    const rows = new Map(quantityRows(db, params.manualId).map((row) => [row.symbol, row]));
    const { holds, items } = proof(programOf(db, params.manualId));
    return {
      holds,
      items: items.flatMap((item) => {
        const row = rows.get(item.symbol);
        return row === undefined ? [] : [{ ...item, quantityId: row.id, pageId: row.pageId }];
      }),
    };
  });
}

function settingRoutes(router: ApiRouter, { db, now }: Tools): void {
  serve(router, api.listSettings, ({ params, query }) => {
    existingManual(db, params.manualId);
    const offset = offsetOf(query);
    return pageOfList(settingRows(db, params.manualId).slice(offset, offset + query.limit + 1), query);
  });
  serve(router, api.saveSetting, ({ user, params, body }) => {
    existingManual(db, params.manualId);
    const row = { id: randomUUID(), manualId: params.manualId, ...body, createdBy: user.name, createdAt: now() };
    db.transaction((tx) => {
      tx.insert(settings).values(row).run();
      record(tx, user, {
        did: 'saved a setting',
        subject: body.name,
        subjectId: row.id,
        details: { inputs: body.inputs },
      });
    });
    return { ...row, createdAt: row.createdAt.toISOString() };
  });
  serve(router, api.deleteSetting, ({ user, params }) => {
    const row = findSetting(db, params.manualId, params.settingId);
    if (row === undefined) throw new AppError('not-found', 'This manual has no such setting.');
    db.transaction((tx) => {
      tx.delete(settings).where(eq(settings.id, row.id)).run();
      record(tx, user, { did: 'deleted a setting', subject: row.name, subjectId: row.id });
    });
    return { ok: true as const };
  });
}
