import { eq, sql } from 'drizzle-orm';
import { getPageNumbers } from '#shared/api/page-numbers.ts';
import { listOpenReferences, listTargets } from '#shared/api/references.ts';
import { type Target, openReferences, resolver, targetsOf } from '#shared/document/cross-references.ts';
import { pageNumbersOf } from '#shared/document/page-numbers.ts';
import { partsOfManual } from '#shared/document/parts-of-manual.ts';
import { pages, revisions } from '#server/db/schema/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import { documentsOfManual } from './queries.ts';

export function referenceRoutes(api: ApiRouter, { db }: Tools): void {
  const targetsIn = rememberTargets(db);
  serve(api, listTargets, ({ params }) => {
    existingManual(db, params.manualId);
    return { items: targetsIn(params.manualId), nextCursor: null };
  });
  serve(api, listOpenReferences, ({ params }) => {
    existingManual(db, params.manualId);
    const resolve = resolver(targetsIn(params.manualId));
    return { items: openReferences(documentsOfManual(db, params.manualId), resolve), nextCursor: null };
  });
  serve(api, getPageNumbers, ({ params }) => {
    existingManual(db, params.manualId);
    return pageNumbersOf(documentsOfManual(db, params.manualId));
  });
}

/** So many manuals' targets are kept: every page that is read asks for them, and finding them reads all its pages. */
const manualsKept = 20;

function rememberTargets(db: Connection): (manualId: string) => Target[] {
  const kept = new Map<string, { stamp: string; targets: Target[] }>();
  return (manualId) => {
    const stamp = stampOf(db, manualId);
    const known = kept.get(manualId);
    if (known?.stamp === stamp) return known.targets;
    const documents = documentsOfManual(db, manualId);
    const targets = targetsOf(documents, partsOfManual(documents));
    kept.delete(manualId);
    kept.set(manualId, { stamp, targets });
    const oldest = kept.keys().next().value;
    if (kept.size > manualsKept && oldest !== undefined) kept.delete(oldest);
    return targets;
  };
}

/** Changes with every revision, and with every page that comes, goes or gets another name. */
function stampOf(db: Connection, manualId: string): string {
  const found = db
    .select({
      newest: sql<number>`max(${revisions.id})`,
      count: sql<number>`count(distinct ${pages.id})`,
      labels: sql<string>`group_concat(distinct ${pages.label})`,
    })
    .from(pages)
    .leftJoin(revisions, eq(revisions.pageId, pages.id))
    .where(eq(pages.manualId, manualId))
    .get();
  return JSON.stringify(found);
}
