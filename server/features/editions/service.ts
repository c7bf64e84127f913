import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { Edition, EditionDraft, EditionStanding } from '#shared/api/editions.ts';
import type { Page } from '#shared/api/pages.ts';
import { type ProofItem, proof } from '#shared/calc/proof.ts';
import { blockZones } from '#shared/document/zones.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { editionPages, editions } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { existingManual } from '#server/features/manuals/index.ts';
import { type PageRow, existingPage, pageSummary } from '#server/features/pages/index.ts';
import { findRevision, hasPendingEdits, onCurrentPicture, signOffOf } from '#server/features/revisions/index.ts';
import { programOf } from '#server/features/values/index.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import type { Connection } from '#server/jobs/events.ts';
import { differenceOf, isNothing, stateOfEdition, stateOfWork } from './difference.ts';
import { editionReply, editionRows, existingEdition, findEditionPage, latestEdition, pagesOfWork } from './queries.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

const isRead = ({ revision }: PageRow): boolean => revision > 0;
const nextNumber = (db: Connection, manualId: string): number => (editionRows(db, manualId)[0]?.number ?? 0) + 1;
const labelled = ({ id, label }: PageRow) => ({ pageId: id, label });

const disagreeingIn = (db: Connection, manualId: string): ProofItem[] =>
  proof(programOf(db, manualId)).items.filter(({ agrees }) => !agrees);

/** What publishing now would make, and what speaks against it. All of it warns; nothing bars. */
export function draftOf(db: Connection, manualId: string): EditionDraft {
  const all = pagesOfWork(db, manualId);
  const taken = all.filter(isRead);
  const latest = latestEdition(db, manualId);
  return {
    number: nextNumber(db, manualId),
    pages: taken.length,
    unread: all.filter((page) => !isRead(page)).map(labelled),
    notProofed: taken.filter(({ state }) => state !== 'proofed').map(labelled),
    doubts: taken
      .filter(({ doubtCount }) => doubtCount > 0)
      .map((page) => ({ ...labelled(page), doubtCount: page.doubtCount })),
    beingWritten: taken.filter(({ id }) => hasPendingEdits(db, id)).map(labelled),
    disagreeing: disagreeingIn(db, manualId),
    isSame: latest !== undefined && isNothing(differenceOf(db, stateOfEdition(db, latest), stateOfWork(db, manualId))),
  };
}

type Publishing = { manualId: string; number: number; name: string; note: string };

/** Publishes the manual as it stands at this moment, in one transaction: pages, quantities and frequency plan. */
export function publish(tools: Tools, who: Who, { manualId, number, name, note }: Publishing): Edition {
  const row = tools.db.transaction((tx) => {
    const manual = existingManual(tx, manualId);
    refuseNumber(tx, manualId, number);
    const all = pagesOfWork(tx, manualId);
    const taken = all.filter(isRead);
    if (taken.length === 0)
      throw new AppError(
        'cannot-do',
        'No page of this manual has been read yet, so there is nothing to publish. Publish it when its first pages are read.',
      );
    const { quantities, plan } = stateOfWork(tx, manualId);
    const standing = standingOf(all, disagreeingIn(tx, manualId).length);
    const made = tx
      .insert(editions)
      .values({
        ...{ id: randomUUID(), manualId, number, name, note, standing, quantities, plan },
        ...{ publishedBy: who.name, publishedById: who.id, publishedAt: tools.now() },
      })
      .returning()
      .get();
    for (const page of taken)
      tx.insert(editionPages)
        .values(editionPageOf(tx, page, made.id))
        .run();
    record(tx, who, {
      ...{ did: 'published an edition', subject: `${manual.title}, edition ${number}`, subjectId: manualId },
      details: { number, name, note, ...standing },
    });
    return made;
  });
  tools.live.emit({ type: 'editions', manualId });
  return editionReply(tools.db, row);
}

function refuseNumber(tx: Connection, manualId: string, number: number): void {
  const [newest] = editionRows(tx, manualId);
  if (number === (newest?.number ?? 0) + 1) return;
  throw new AppError(
    'revision-conflict',
    newest === undefined
      ? 'The first edition of a manual has the number 1.'
      : `${newest.publishedBy} published edition ${newest.number} meanwhile. Look at what has changed since, then publish again.`,
    { current: newest?.number ?? 0 },
  );
}

function standingOf(all: readonly PageRow[], disagreeing: number): EditionStanding {
  const taken = all.filter(isRead);
  return {
    pages: taken.length,
    unread: all.length - taken.length,
    notProofed: taken.filter(({ state }) => state !== 'proofed').length,
    doubts: taken.reduce((sum, { doubtCount }) => sum + doubtCount, 0),
    disagreeing,
  };
}

function editionPageOf(tx: Connection, page: PageRow, editionId: string): typeof editionPages.$inferInsert {
  const { id, position, label, state, revision, doubtCount } = page;
  const signOff = signOffOf(tx, page);
  return {
    ...{ editionId, pageId: id, position, label, state, revision, doubtCount },
    signedBy: signOff?.signedBy ?? null,
    signedAt: signOff === null ? null : new Date(signOff.signedAt),
  };
}

type Withdrawing = { manualId: string; number: number; reason: string };

/** It stays in the list and can still be read by its number; readers are shown the one before it. */
export function withdraw(tools: Tools, who: Who, { manualId, number, reason }: Withdrawing): Edition {
  tools.db.transaction((tx) => {
    const manual = existingManual(tx, manualId);
    const { id, withdrawnAt } = existingEdition(tx, manualId, number);
    if (withdrawnAt !== null) throw new AppError('wrong-state', `Edition ${number} is withdrawn already.`);
    tx.update(editions)
      .set({ withdrawnBy: who.name, withdrawnAt: tools.now(), withdrawnReason: reason })
      .where(eq(editions.id, id))
      .run();
    record(tx, who, {
      ...{ did: 'withdrew an edition', subject: `${manual.title}, edition ${number}`, subjectId: manualId },
      details: { number, reason },
    });
  });
  tools.live.emit({ type: 'editions', manualId });
  return editionReply(tools.db, existingEdition(tools.db, manualId, number));
}

/** A page as an edition holds it. Its words are of then; places on the scan follow the picture that is there now. */
export function pageOfEdition(
  db: Connection,
  { manualId, number, pageId }: { manualId: string; number: number; pageId: string },
): Page {
  const held = findEditionPage(db, existingEdition(db, manualId, number).id, pageId);
  if (held === undefined) throw new AppError('not-found', `This page is not in edition ${number}.`);
  const page = existingPage(db, pageId);
  const revision = findRevision(db, pageId, held.revision);
  if (revision === undefined) throw new Error(`Edition ${number} holds a revision of page ${pageId} that is gone.`);
  const document = onCurrentPicture(db, page, revision);
  const { position, label, state, doubtCount, signedBy, signedAt } = held;
  return {
    ...pageSummary(page),
    ...{ position, label, state, doubtCount, manualId, revision: held.revision },
    width: page.width,
    height: page.height,
    document,
    zones: blockZones(document),
    signOff: signedBy === null || signedAt === null ? null : { signedBy, signedAt: signedAt.toISOString(), doubtCount },
    authorIds: revision.authorIds,
  };
}
