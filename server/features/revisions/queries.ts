import { and, asc, desc, eq } from 'drizzle-orm';
import type { RevisionSummary } from '#shared/api/revisions.ts';
import { type PageDocument, readDocument } from '#shared/document/page-document.ts';
import { pages, readings, revisions } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type RevisionRow = typeof revisions.$inferSelect;

export const findRevision = (db: Connection, pageId: string, number: number): RevisionRow | undefined =>
  db
    .select()
    .from(revisions)
    .where(and(eq(revisions.pageId, pageId), eq(revisions.number, number)))
    .get();

const { document: _document, ...summaryColumns } = {
  document: revisions.document,
  number: revisions.number,
  origin: revisions.origin,
  author: revisions.author,
  note: revisions.note,
  savedAt: revisions.savedAt,
  doubtCount: revisions.doubtCount,
};

export const revisionRows = (
  db: Connection,
  pageId: string,
  { limit, offset }: { limit: number; offset: number },
): RevisionSummary[] =>
  db
    .select(summaryColumns)
    .from(revisions)
    .where(eq(revisions.pageId, pageId))
    .orderBy(desc(revisions.number))
    .limit(limit)
    .offset(offset)
    .all()
    .map((row) => ({ ...row, savedAt: row.savedAt.toISOString() }));

export const revisionsOldestFirst = (db: Connection, pageId: string): RevisionRow[] =>
  db.select().from(revisions).where(eq(revisions.pageId, pageId)).orderBy(asc(revisions.number)).all();

export const insertRevision = (db: Connection, row: typeof revisions.$inferInsert): RevisionRow =>
  db.insert(revisions).values(row).returning().get();

export const isTouchedByPeople = (db: Connection, pageId: string): boolean =>
  db
    .select({ id: revisions.id })
    .from(revisions)
    .where(and(eq(revisions.pageId, pageId), eq(revisions.origin, 'person')))
    .limit(1)
    .get() !== undefined;

export const findReading = (db: Connection, id: number) => db.select().from(readings).where(eq(readings.id, id)).get();

/** The stored document as this version of the program reads it: an older one is moved up on the way. */
export function currentDocument(row: RevisionRow): PageDocument {
  const read = readDocument(row.document);
  if (!read.ok)
    throw new Error(`Revision ${row.number} of page ${row.pageId} cannot be read: ${read.error[0]?.message}`);
  return read.value;
}

/** The current documents of a manual's pages, in order; pages that have none yet are left out. */
export const documentsOfManual = (
  db: Connection,
  manualId: string,
): { pageId: string; label: string; document: PageDocument }[] =>
  db
    .select({ page: pages, revision: revisions })
    .from(pages)
    .innerJoin(revisions, and(eq(revisions.pageId, pages.id), eq(revisions.number, pages.revision)))
    .where(eq(pages.manualId, manualId))
    .orderBy(pages.position)
    .all()
    .map(({ page, revision }) => ({ pageId: page.id, label: page.label, document: currentDocument(revision) }));

export const documentOfPage = (db: Connection, pageId: string, number: number): PageDocument | null => {
  const row = number === 0 ? undefined : findRevision(db, pageId, number);
  return row === undefined ? null : currentDocument(row);
};
