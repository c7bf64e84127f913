import { countDoubts } from '#shared/document/text-of.ts';
import { type PageDocument, readDocument } from '#shared/document/page-document.ts';
import { between, moveZones } from '#shared/document/zones.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { record } from '#server/features/accounts/index.ts';
import { type PageRow, changePage, existingPage, tellPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { type RevisionRow, currentDocument, findReading, findRevision, insertRevision } from './queries.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;
type Edit = { pageId: string; baseRevision: number; document: unknown; note: string };

export const revisionReply = (row: RevisionRow) => ({
  pageId: row.pageId,
  number: row.number,
  origin: row.origin,
  author: row.author,
  note: row.note,
  savedAt: row.savedAt.toISOString(),
  doubtCount: row.doubtCount,
  document: currentDocument(row) as Record<string, unknown>,
});

/** Saves an edit as a new revision, unless somebody else saved since the editor opened the page: then 409, with theirs. */
export function saveDocument(tools: Tools, who: Who, { pageId, baseRevision, document, note }: Edit): RevisionRow {
  const checked = readDocument(document);
  if (!checked.ok) {
    const [first] = checked.error;
    throw new AppError('invalid-input', `The document is not as described. ${first?.message ?? ''}`, {
      issues: checked.error,
    });
  }
  const saved = tools.db.transaction((tx) => {
    const page = existingPage(tx, pageId);
    if (page.revision !== baseRevision) throw conflict(tx, page, baseRevision);
    const row = addRevision(tools, tx, { page, who, note, document: checked.value, origin: 'person' });
    record(tx, who, {
      did: 'saved a page',
      subject: page.label,
      subjectId: pageId,
      details: { revision: row.number, note },
    });
    return row;
  });
  tools.wake();
  tellPage(tools, pageId);
  return saved;
}

function conflict(tx: Connection, page: PageRow, baseRevision: number): AppError {
  const current = findRevision(tx, page.id, page.revision);
  const by = current === undefined ? '' : ` by ${current.author}`;
  return new AppError(
    'revision-conflict',
    `This page was saved${by} while you worked on revision ${baseRevision}; it is at revision ${page.revision} now. Your text is kept: merge it.`,
    { current: current === undefined ? null : revisionReply(current) },
  );
}

/** A new revision that is as an older one was. Nothing is taken back: the ones between stay in the list. */
export function restoreRevision(
  tools: Tools,
  who: Who,
  { pageId, number, note }: { pageId: string; number: number; note: string },
): RevisionRow {
  const restored = tools.db.transaction((tx) => {
    const page = existingPage(tx, pageId);
    const old = findRevision(tx, pageId, number);
    if (old === undefined) throw new AppError('not-found', `This page has no revision ${number}.`);
    const document = onCurrentPicture(tx, page, old);
    const row = addRevision(tools, tx, {
      page,
      who,
      document,
      origin: 'person',
      note: note === '' ? `As revision ${number} was` : note,
    });
    record(tx, who, { did: 'restored a revision', subject: page.label, subjectId: pageId, details: { number } });
    return row;
  });
  tools.wake();
  tellPage(tools, pageId);
  return restored;
}

/** An older revision may speak of an older picture of the page, straightened otherwise: its zones move along. */
export function onCurrentPicture(tx: Connection, page: PageRow, old: RevisionRow): PageDocument {
  const document = currentDocument(old);
  if (old.readingId === null || page.readingId === null || old.readingId === page.readingId) return document;
  const [from, to] = [findReading(tx, old.readingId), findReading(tx, page.readingId)];
  return from === undefined || to === undefined
    ? document
    : moveZones(document, between(from.content.transform, to.content.transform));
}

type NewRevision = {
  page: PageRow;
  who: Who | null;
  note: string;
  document: PageDocument;
  origin: RevisionRow['origin'];
};

/** Writes the revision, the page's counts that follow from it, and the next step of its trip, all in the caller's transaction. */
export function addRevision(
  tools: Tools,
  tx: Connection,
  { page, who, note, document, origin }: NewRevision,
): RevisionRow {
  const doubtCount = countDoubts(document);
  const row = insertRevision(tx, {
    pageId: page.id,
    number: page.revision + 1,
    origin,
    author: who?.name ?? 'Recognition',
    authorId: who?.id ?? null,
    readingId: page.readingId,
    note,
    doubtCount,
    document,
    savedAt: tools.now(),
  });
  const state = origin === 'person' ? 'corrected' : page.state;
  changePage(tx, page.id, { revision: row.number, doubtCount, state });
  const subject = { subjectId: page.id, manualId: page.manualId };
  tools.announce(tx, 'revision.saved', subject);
  if (origin === 'person') tools.announce(tx, 'page.corrected', subject);
  return row;
}
