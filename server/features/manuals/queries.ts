import { and, desc, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm';
import type { Manual } from '#shared/api/manuals.ts';
import type { PageState } from '#shared/api/pages.ts';
import type { Source } from '#shared/api/sources.ts';
import { manuals, pages, quantities, sources } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type ManualRow = typeof manuals.$inferSelect;
export type SourceRow = typeof sources.$inferSelect;

export const findManual = (db: Connection, id: string): ManualRow | undefined =>
  db.select().from(manuals).where(eq(manuals.id, id)).get();

export const manualRows = (
  db: Connection,
  bin: boolean,
  { limit, offset }: { limit: number; offset: number },
): ManualRow[] =>
  db
    .select()
    .from(manuals)
    .where(bin ? isNotNull(manuals.deletedAt) : isNull(manuals.deletedAt))
    .orderBy(desc(manuals.createdAt), manuals.id)
    .limit(limit)
    .offset(offset)
    .all();

/** Manuals with what their pages add up to, in two queries however many manuals there are. */
export function withCounts(db: Connection, rows: ManualRow[]): Manual[] {
  const ids = rows.map(({ id }) => id);
  const pageRows = db
    .select({
      manualId: pages.manualId,
      state: pages.state,
      count: sql<number>`count(*)`,
      doubts: sql<number>`sum(${pages.doubtCount})`,
    })
    .from(pages)
    .where(inArray(pages.manualId, ids))
    .groupBy(pages.manualId, pages.state)
    .all();
  const quantityRows = db
    .select({ manualId: quantities.manualId, count: sql<number>`count(*)` })
    .from(quantities)
    .where(inArray(quantities.manualId, ids))
    .groupBy(quantities.manualId)
    .all();
  return rows.map((row) => {
    const own = pageRows.filter(({ manualId }) => manualId === row.id);
    const of = (state: PageState): number => own.find((each) => each.state === state)?.count ?? 0;
    const { readingPaused, createdAt, deletedAt, ...facts } = row;
    return {
      ...facts,
      createdAt: createdAt.toISOString(),
      deletedAt: deletedAt?.toISOString() ?? null,
      reading: readingPaused ? 'paused' : 'running',
      pageCounts: {
        all: own.reduce((sum, { count }) => sum + count, 0),
        waiting: of('waiting'),
        reading: of('reading'),
        read: of('read'),
        failed: of('failed'),
        corrected: of('corrected'),
        proofed: of('proofed'),
      },
      doubtCount: own.reduce((sum, { doubts }) => sum + doubts, 0),
      quantityCount: quantityRows.find(({ manualId }) => manualId === row.id)?.count ?? 0,
    };
  });
}

export const findSource = (db: Connection, id: string): SourceRow | undefined =>
  db.select().from(sources).where(eq(sources.id, id)).get();

export const findSameBytes = (db: Connection, manualId: string, sha256: string): SourceRow | undefined =>
  db
    .select()
    .from(sources)
    .where(and(eq(sources.manualId, manualId), eq(sources.sha256, sha256)))
    .get();

export const sourceRows = (
  db: Connection,
  manualId: string,
  { limit, offset }: { limit: number; offset: number },
): SourceRow[] =>
  db
    .select()
    .from(sources)
    .where(eq(sources.manualId, manualId))
    .orderBy(sources.createdAt, sources.id)
    .limit(limit)
    .offset(offset)
    .all();

export const sourceReply = ({ createdAt, createdBy: _createdBy, ...row }: SourceRow): Source => ({
  ...row,
  createdAt: createdAt.toISOString(),
});
