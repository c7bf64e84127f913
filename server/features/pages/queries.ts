import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import type { PageState, PageSummary } from '#shared/api/pages.ts';
import { editionPages, editions, jobs, pages, readings } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type PageRow = typeof pages.$inferSelect;

export const findPage = (db: Connection, id: string): PageRow | undefined =>
  db.select().from(pages).where(eq(pages.id, id)).get();

export const pageRows = (
  db: Connection,
  manualId: string,
  { limit, offset }: { limit: number; offset: number },
): PageRow[] =>
  db
    .select()
    .from(pages)
    .where(eq(pages.manualId, manualId))
    .orderBy(asc(pages.position))
    .limit(limit)
    .offset(offset)
    .all();

export const lastPosition = (db: Connection, manualId: string): number =>
  db
    .select({ last: sql<number>`coalesce(max(${pages.position}), 0)` })
    .from(pages)
    .where(eq(pages.manualId, manualId))
    .get()?.last ?? 0;

export const insertPages = (db: Connection, rows: (typeof pages.$inferInsert)[]): void => {
  // SQLite takes a limited number of values in one statement.
  const atOnce = 500;
  for (let at = 0; at < rows.length; at += atOnce)
    db.insert(pages)
      .values(rows.slice(at, at + atOnce))
      .run();
};

export const changePage = (db: Connection, id: string, change: Partial<PageRow>): void => {
  db.update(pages).set(change).where(eq(pages.id, id)).run();
};

/** The last part of the picture's key, which no other picture of the page has. */
const imageVersion = ({ imageKey, drawnKey }: PageRow): string | null =>
  (imageKey ?? drawnKey)?.split('/').pop()?.replace('.jpg', '') ?? null;

export const pageSummary = (row: PageRow): PageSummary => ({
  id: row.id,
  position: row.position,
  label: row.label,
  state: row.state,
  confidence: row.confidence,
  doubtCount: row.doubtCount,
  revision: row.revision,
  problem: row.problem,
  half: row.half,
  warnings: row.warnings,
  imageVersion: imageVersion(row),
});

export const newestReading = (db: Connection, row: PageRow) =>
  row.readingId === null ? undefined : db.select().from(readings).where(eq(readings.id, row.readingId)).get();

export const pagesInState = (db: Connection, manualId: string, states: PageState[]): PageRow[] =>
  db
    .select()
    .from(pages)
    .where(and(eq(pages.manualId, manualId), inArray(pages.state, states)))
    .all();

/** Takes the waiting and resting work on pages out of the queue. Work under way is let go when it comes back. */
export const dropJobs = (db: Connection, pageIds: string[]): void => {
  db.delete(jobs)
    .where(and(inArray(jobs.subjectId, pageIds), inArray(jobs.step, ['draw-page', 'read-page'])))
    .run();
};

/** The numbers of the editions that hold a page, or one revision of it, oldest first. */
export const editionsHolding = (db: Connection, pageId: string, revision?: number): number[] =>
  db
    .select({ number: editions.number })
    .from(editionPages)
    .innerJoin(editions, eq(editions.id, editionPages.editionId))
    .where(
      and(eq(editionPages.pageId, pageId), revision === undefined ? undefined : eq(editionPages.revision, revision)),
    )
    .orderBy(asc(editions.number))
    .all()
    .map(({ number }) => number);
