import { blockAuthors } from '#shared/document/block-authors.ts';
import { type Part, restorePart } from '#shared/document/restore-part.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { existingPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { type RevisionRow, currentDocument, documentOfPage, findRevision, revisionsOldestFirst } from './queries.ts';
import { onCurrentPicture, saveDocument } from './service.ts';

type Restoring = Part & { pageId: string; number: number; baseRevision: number };

/** An older block or cell comes back as an edit of the present page, so that people who have it open see it arrive. */
export function restoreOnePart(
  tools: Tools,
  who: Pick<SignedIn, 'id' | 'name'>,
  { pageId, number, baseRevision, ...part }: Restoring,
): RevisionRow {
  const page = existingPage(tools.db, pageId);
  const old = findRevision(tools.db, pageId, number);
  const now = documentOfPage(tools.db, pageId, baseRevision);
  if (old === undefined || now === null) throw new AppError('not-found', `This page has no revision ${number}.`);
  const restored = restorePart(now, onCurrentPicture(tools.db, page, old), part);
  if (!restored.ok) throw new AppError('cannot-do', restored.error);
  const note = `${part.cell === undefined ? 'One block' : 'One cell'} as in revision ${number}`;
  return saveDocument(tools, who, { pageId, baseRevision, document: restored.value, note });
}

/** Who wrote each block of a page as it stands. */
export function authorsOfBlocks(db: Connection, pageId: string) {
  existingPage(db, pageId);
  const rows = revisionsOldestFirst(db, pageId).map((row) => ({ ...row, document: currentDocument(row) }));
  return blockAuthors(rows).map(({ revision, ...block }) => {
    const { number, origin, author, note, savedAt, doubtCount } = revision;
    return { ...block, revision: { number, origin, author, note, doubtCount, savedAt: savedAt.toISOString() } };
  });
}
