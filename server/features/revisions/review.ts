import { and, desc, eq, isNull, lte } from 'drizzle-orm';
import type { Page } from '#shared/api/pages.ts';
import { blockZones } from '#shared/document/zones.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { counted } from '#shared/kit/counted.ts';
import { revisions, signOffs } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { type PageRow, changePage, existingPage, pageSummary, tellPage } from '#server/features/pages/index.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import type { Connection } from '#server/jobs/events.ts';
import { documentOfPage, isTouchedByPeople } from './queries.ts';
import { hasPendingEdits } from './shared-text.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

/** A page as it stands, with whose text it is and who signed it. */
export function pageReply(db: Connection, page: PageRow): Page {
  const document = documentOfPage(db, page.id, page.revision);
  const { manualId, width, height } = page;
  return {
    ...pageSummary(page),
    manualId,
    width,
    height,
    document,
    zones: document === null ? [] : blockZones(document),
    signOff: signOffOf(db, page),
    authorIds: authorsOfText(db, page),
  };
}

/** Of the page's present revision; null unless the page is proofed. */
export function signOffOf(db: Connection, { id, state, revision }: PageRow): Page['signOff'] {
  const row = state === 'proofed' ? standingSignOff(db, id, revision) : undefined;
  if (row === undefined) return null;
  const { signedBy, signedAt, doubtCount } = row;
  return { signedBy, signedAt: signedAt.toISOString(), doubtCount };
}

const standingSignOff = (db: Connection, pageId: string, revision: number) =>
  db
    .select()
    .from(signOffs)
    .where(and(eq(signOffs.pageId, pageId), eq(signOffs.revision, revision), isNull(signOffs.takenBackAt)))
    .orderBy(desc(signOffs.id))
    .get();

/** Whose the text is: of the newest revision by people, also where the machine has read the page again since. */
const authorsOfText = (db: Connection, { id, revision }: PageRow): string[] =>
  db
    .select({ authorIds: revisions.authorIds })
    .from(revisions)
    .where(and(eq(revisions.pageId, id), eq(revisions.origin, 'person'), lte(revisions.number, revision)))
    .orderBy(desc(revisions.number))
    .limit(1)
    .get()?.authorIds ?? [];

type Signing = { pageId: string; revision: number; doubts: number };

/** Signs the page's newest text off. Who wrote it cannot: four eyes are the point. */
export function signPage(tools: Tools, who: Who, { pageId, revision, doubts }: Signing): Page {
  tools.db.transaction((tx) => {
    const page = existingPage(tx, pageId);
    refuseSigning(tx, who, { page, revision, doubts });
    const { doubtCount, label } = page;
    tx.insert(signOffs)
      .values({ pageId, revision, signedBy: who.name, signedById: who.id, signedAt: tools.now(), doubtCount })
      .run();
    changePage(tx, pageId, { state: 'proofed' });
    record(tx, who, {
      ...{ did: 'signed a page off as proofed', subject: label, subjectId: pageId },
      details: { revision, doubts: doubtCount },
    });
  });
  tellPage(tools, pageId);
  return pageReply(tools.db, existingPage(tools.db, pageId));
}

function refuseSigning(tx: Connection, who: Who, asked: { page: PageRow; revision: number; doubts: number }): void {
  const { page, revision, doubts } = asked;
  const { label, doubtCount } = page;
  if (page.revision === 0) throw new AppError('cannot-do', `Page ${label} is not read yet: there is nothing to proof.`);
  if (page.revision !== revision)
    throw new AppError(
      'revision-conflict',
      `Page ${label} is at revision ${page.revision} now; you read revision ${revision}. Read it again before you sign.`,
      { current: page.revision },
    );
  if (hasPendingEdits(tx, page.id))
    throw new AppError(
      'revision-conflict',
      `Somebody is writing on page ${label} at this moment. Sign it when their text is saved.`,
      { current: page.revision },
    );
  if (page.state === 'proofed') throw new AppError('wrong-state', `Page ${label} is signed off already.`);
  if (page.state !== 'corrected' && page.state !== 'read')
    throw new AppError('wrong-state', `Page ${label} is being read. Sign it when that is done.`);
  if (authorsOfText(tx, page).includes(who.id))
    throw new AppError('cannot-do', `You wrote the newest text of page ${label}. Another editor has to sign it off.`);
  if (doubtCount !== doubts)
    throw new AppError(
      'cannot-do',
      `Page ${label} has ${counted(doubtCount, 'doubt')} left. Confirm that number to sign it off all the same.`,
      { doubts: doubtCount },
    );
}

export function takeBackSignature(tools: Tools, who: Who, pageId: string): Page {
  tools.db.transaction((tx) => {
    const { state, revision, label } = existingPage(tx, pageId);
    if (state !== 'proofed') throw new AppError('wrong-state', `Page ${label} is not signed off.`);
    tx.update(signOffs)
      .set({ takenBackBy: who.name, takenBackAt: tools.now() })
      .where(and(eq(signOffs.pageId, pageId), eq(signOffs.revision, revision), isNull(signOffs.takenBackAt)))
      .run();
    changePage(tx, pageId, { state: isTouchedByPeople(tx, pageId) ? 'corrected' : 'read' });
    record(tx, who, {
      ...{ did: 'took back that a page is proofed', subject: label, subjectId: pageId },
      details: { revision },
    });
  });
  tellPage(tools, pageId);
  return pageReply(tools.db, existingPage(tools.db, pageId));
}
