import { randomUUID } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import type { Manual, ManualInput } from '#shared/api/manuals.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { manuals } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { type ManualRow, findManual, withCounts } from './queries.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

/** The manual, or a 404: also for one in the bin, unless `evenBinned`. */
export function existingManual(db: Connection, id: string, evenBinned = false): ManualRow {
  const row = findManual(db, id);
  if (row === undefined || (row.deletedAt !== null && !evenBinned))
    throw new AppError('not-found', 'There is no such manual.');
  return row;
}

export const manualReply = (db: Connection, id: string): Manual => {
  const [reply] = withCounts(db, [existingManual(db, id, true)]);
  if (reply === undefined) throw new AppError('not-found', 'There is no such manual.');
  return reply;
};

export function createManual({ db, now }: Tools, who: Who, given: ManualInput): Manual {
  const row = {
    id: randomUUID(),
    title: given.title,
    equipment: given.equipment ?? null,
    maker: given.maker ?? null,
    documentNumber: given.documentNumber ?? null,
    editionDate: given.editionDate ?? null,
    createdAt: now(),
    createdBy: who.name,
  };
  db.transaction((tx) => {
    tx.insert(manuals).values(row).run();
    record(tx, who, { did: 'added a manual', subject: row.title, subjectId: row.id });
  });
  return manualReply(db, row.id);
}

type Changeable = ManualInput & Pick<Manual, 'learns' | 'ownUnits'>;
type Change = { [K in keyof Changeable]?: Changeable[K] | undefined };

export function updateManual(
  { db, announce, wake }: Tools,
  who: Who,
  { manualId, change }: { manualId: string; change: Change },
): Manual {
  const row = existingManual(db, manualId);
  const set = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
  if (Object.keys(set).length > 0) {
    db.transaction((tx) => {
      tx.update(manuals).set(set).where(eq(manuals.id, manualId)).run();
      record(tx, who, { did: 'changed a manual', subject: row.title, subjectId: manualId, details: set });
      if ('learns' in set || 'ownUnits' in set)
        announce(tx, 'lessons.changed', { subjectId: manualId, manualId, wish: { after: 0 } });
    });
    wake();
  }
  return manualReply(db, manualId);
}

export function binManual({ db, now }: Tools, who: Who, manualId: string): void {
  const row = existingManual(db, manualId);
  db.transaction((tx) => {
    tx.update(manuals).set({ deletedAt: now() }).where(eq(manuals.id, manualId)).run();
    record(tx, who, { did: 'put a manual in the bin', subject: row.title, subjectId: manualId });
  });
}

export function restoreManual({ db, wake }: Tools, who: Who, manualId: string): Manual {
  const row = existingManual(db, manualId, true);
  db.transaction((tx) => {
    tx.update(manuals)
      .set({ deletedAt: null })
      .where(and(eq(manuals.id, manualId)))
      .run();
    record(tx, who, { did: 'took a manual out of the bin', subject: row.title, subjectId: manualId });
  });
  wake();
  return manualReply(db, manualId);
}
