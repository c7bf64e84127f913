import { eq } from 'drizzle-orm';
import * as api from '#shared/api/calculations.ts';
import { AppError } from '#shared/kit/app-error.ts';
import type { PrintedNumber } from '#shared/relations/printed-number.ts';
import type { RelationProposal } from '#shared/relations/propose.ts';
import { printedNumbersOf } from '#shared/search/printed-numbers.ts';
import { relationVerdicts } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { documentsOfManual } from '#server/features/revisions/index.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { WorkerFailure } from '#server/jobs/worker-pool.ts';
import { quantityRows } from './queries.ts';

/** Looking through more numbers than this takes longer than anybody waits. */
const mostNumbers = 800;

export function relationRoutes(router: ApiRouter, tools: Tools & { sideWorker: SideWorker }): void {
  const { db } = tools;
  serve(router, api.findRelations, async ({ params }) => {
    existingManual(db, params.manualId);
    const pages = documentsOfManual(db, params.manualId);
    const labels = new Map(pages.map(({ pageId, label }) => [pageId, label]));
    const quantities = quantityRows(db, params.manualId);
    const symbols = new Map(quantities.map(({ id, symbol }) => [id, symbol]));
    const known = new Set(
      quantities.flatMap(({ symbol, definition }) => (definition.kind === 'derived' ? [symbol] : [])),
    );
    const numbers = printedNumbersOf(pages, symbols).slice(0, mostNumbers);
    const judged = new Set(
      db
        .select({ relation: relationVerdicts.relation })
        .from(relationVerdicts)
        .where(eq(relationVerdicts.manualId, params.manualId))
        .all()
        .map(({ relation }) => relation),
    );
    const found = (await proposalsFor(tools.sideWorker, numbers)).filter(
      // What has a formula already needs no other.
      ({ filled, target }) => !judged.has(filled) && !known.has(target),
    );
    return { items: found.map((each) => replyOf(each, numbers, labels)), numbers: numbers.length };
  });
  serve(router, api.judgeRelation, ({ user, params, body }) => {
    const manual = existingManual(db, params.manualId);
    const row = { manualId: manual.id, ...body, saidBy: user.name, saidAt: tools.now() };
    db.transaction((tx) => {
      tx.insert(relationVerdicts)
        .values(row)
        .onConflictDoUpdate({ target: [relationVerdicts.manualId, relationVerdicts.relation], set: row })
        .run();
      record(tx, user, { did: `${body.verdict} a relation`, subject: body.relation, subjectId: manual.id });
    });
    return { ok: true as const };
  });
}

/** In the process for short work, so that the server answers others meanwhile. */
async function proposalsFor(worker: SideWorker, numbers: PrintedNumber[]): Promise<RelationProposal[]> {
  try {
    return (await worker.run('propose-relations', numbers)) as RelationProposal[];
  } catch (error) {
    if (error instanceof WorkerFailure)
      throw new AppError('cannot-do', `The relations could not be looked for. ${error.message}`);
    throw error;
  }
}

function replyOf(
  { table, numbers: ids, ...proposal }: RelationProposal,
  numbers: readonly PrintedNumber[],
  labels: ReadonlyMap<string, string>,
): api.RelationProposal {
  const own = numbers.filter(({ id }) => ids.includes(id));
  return {
    ...proposal,
    table: table === undefined ? null : { holds: table.holds, rows: table.rows, failing: table.failing },
    numbers: own.map(({ id, text, unit, page, label = '', symbol }) => ({
      ...{ id, text, unit, label },
      ...{ pageId: page, pageLabel: labels.get(page) ?? '', symbol: symbol ?? null },
    })),
  };
}
