import { countDoubts } from '#shared/document/text-of.ts';
import { type PageDocument, readDocument } from '#shared/document/page-document.ts';
import { nodeOf } from '#shared/document/page-schema.ts';
import { between, moveZones } from '#shared/document/zones.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { record } from '#server/features/accounts/index.ts';
import { type PageRow, changePage, existingPage, tellPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import {
  type RevisionRow,
  currentDocument,
  documentOfPage,
  findReading,
  findRevision,
  insertRevision,
} from './queries.ts';
import { gatherEdits, intoSharedText, savedStateOf } from './shared-text.ts';

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

/**
 * Saves an edit as a new revision, unless somebody else saved since the editor opened the page: then 409, with theirs.
 * What people who have the page open wrote meanwhile becomes a revision of theirs first, and the edit is merged with it.
 */
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
    const base = savedStateOf(tx, pageId);
    const shared = saveSharedText(tools, tx, { page, note: '' });
    const row = addRevision(tools, tx, {
      page: shared === null ? page : existingPage(tx, pageId),
      ...{ who, note, document: checked.value, origin: 'person', base },
    });
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

/**
 * Makes a revision of what people wrote together since the last one, in their names. Null where nobody wrote, or where
 * what was written was taken back again.
 */
export function saveSharedText(
  tools: Tools,
  tx: Connection,
  { page, note }: { page: PageRow; note: string },
): RevisionRow | null {
  const gathered = gatherEdits(tx, page.id);
  const last = gathered?.writers.at(-1);
  if (gathered === null || last === undefined) return null;
  const { writers, document } = gathered;
  if (!document.ok) {
    const [first] = document.error;
    throw new AppError(
      'cannot-do',
      `What stands on page ${page.label} cannot be kept as a page. ${first?.message ?? ''}`,
    );
  }
  const current = documentOfPage(tx, page.id, page.revision);
  if (current !== null && nodeOf(current).eq(nodeOf(document.value))) return null;
  const who = { id: last.id, name: writers.map(({ name }) => name).join(', ') };
  const authorIds = writers.map(({ id }) => id);
  return addRevision(tools, tx, { page, who, authorIds, note, document: document.value, origin: 'person' });
}

/** The same on demand of a person, with a note, or by itself when the page falls quiet. Answers the page's revision. */
export function saveTogether(
  tools: Tools,
  who: Who | null,
  { pageId, note }: { pageId: string; note: string },
): RevisionRow {
  const [row, isNew] = tools.db.transaction((tx) => {
    const page = existingPage(tx, pageId);
    const made = saveSharedText(tools, tx, { page, note });
    const row = made ?? findRevision(tx, pageId, page.revision);
    if (row === undefined) throw new AppError('cannot-do', 'This page has no text yet: it is not read.');
    if (made !== null)
      record(tx, who ?? { id: row.authorId ?? '', name: row.author }, {
        ...{ did: 'saved a page', subject: page.label, subjectId: pageId },
        details: { revision: row.number, note },
      });
    return [row, made !== null];
  });
  if (isNew) {
    tools.wake();
    tellPage(tools, pageId);
  }
  return row;
}

/** A new revision that is as an older one was. Nothing is taken back: the ones between stay in the list. */
export function restoreRevision(
  tools: Tools,
  who: Who,
  { pageId, number, note }: { pageId: string; number: number; note: string },
): RevisionRow {
  const restored = tools.db.transaction((tx) => {
    saveSharedText(tools, tx, { page: existingPage(tx, pageId), note: '' });
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
  /** Where more than one wrote it. */
  authorIds?: string[];
  note: string;
  document: PageDocument;
  origin: RevisionRow['origin'];
  /** The state of the shared text that the document is an edit of; without it, its present one. */
  base?: Uint8Array | undefined;
};

/** Writes the revision, the page's counts that follow from it, and the next step of its trip, all in the caller's transaction. */
export function addRevision(
  tools: Tools,
  tx: Connection,
  { page, who, authorIds = who === null ? [] : [who.id], note, document: given, origin, base }: NewRevision,
): RevisionRow {
  const document = intoSharedText(tx, page.id, { document: given, base });
  const doubtCount = countDoubts(document);
  const row = insertRevision(tx, {
    pageId: page.id,
    number: page.revision + 1,
    origin,
    author: who?.name ?? 'Recognition',
    authorId: who?.id ?? null,
    authorIds,
    readingId: page.readingId,
    note,
    doubtCount,
    document,
    savedAt: tools.now(),
  });
  // Whoever signed the page off has not seen this.
  const state = origin === 'person' || page.state === 'proofed' ? 'corrected' : page.state;
  changePage(tx, page.id, { revision: row.number, doubtCount, state });
  const subject = { subjectId: page.id, manualId: page.manualId };
  tools.announce(tx, 'revision.saved', subject);
  if (origin === 'person') tools.announce(tx, 'page.corrected', subject);
  return row;
}
