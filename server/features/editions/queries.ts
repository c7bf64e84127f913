import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { Edition } from '#shared/api/editions.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { editionPages, editions, pages } from '#server/db/schema/index.ts';
import type { PageRow } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type EditionRow = typeof editions.$inferSelect;
export type EditionPageRow = typeof editionPages.$inferSelect;

/** Newest first. */
export const editionRows = (db: Connection, manualId: string): EditionRow[] =>
  db.select().from(editions).where(eq(editions.manualId, manualId)).orderBy(desc(editions.number)).all();

/** The one that readers are shown. */
export const latestEdition = (db: Connection, manualId: string): EditionRow | undefined =>
  db
    .select()
    .from(editions)
    .where(and(eq(editions.manualId, manualId), isNull(editions.withdrawnAt)))
    .orderBy(desc(editions.number))
    .limit(1)
    .get();

export function existingEdition(db: Connection, manualId: string, number: number): EditionRow {
  const row = db
    .select()
    .from(editions)
    .where(and(eq(editions.manualId, manualId), eq(editions.number, number)))
    .get();
  if (row === undefined) throw new AppError('not-found', `This manual has no edition ${number}.`);
  return row;
}

export const pagesOfEdition = (db: Connection, editionId: string): EditionPageRow[] =>
  db.select().from(editionPages).where(eq(editionPages.editionId, editionId)).orderBy(asc(editionPages.position)).all();

export const findEditionPage = (db: Connection, editionId: string, pageId: string): EditionPageRow | undefined =>
  db
    .select()
    .from(editionPages)
    .where(and(eq(editionPages.editionId, editionId), eq(editionPages.pageId, pageId)))
    .get();

export const pagesOfWork = (db: Connection, manualId: string): PageRow[] =>
  db.select().from(pages).where(eq(pages.manualId, manualId)).orderBy(asc(pages.position)).all();

export function editionReply(db: Connection, row: EditionRow): Edition {
  const { id, number, name, note, publishedBy, publishedAt, standing } = row;
  const { withdrawnBy, withdrawnAt, withdrawnReason } = row;
  return {
    ...{ id, number, name, note, publishedBy, standing },
    publishedAt: publishedAt.toISOString(),
    withdrawn:
      withdrawnAt === null
        ? null
        : { by: withdrawnBy ?? '', at: withdrawnAt.toISOString(), reason: withdrawnReason ?? '' },
    firstPageId: pagesOfEdition(db, id)[0]?.pageId ?? '',
    isLatest: id === latestEdition(db, row.manualId)?.id,
  };
}
