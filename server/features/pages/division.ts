import { randomUUID } from 'node:crypto';
import { and, eq, gt, sql } from 'drizzle-orm';
import type { PageSummary } from '#shared/api/pages.ts';
import { AppError } from '#shared/kit/app-error.ts';
import {
  comments,
  jobs,
  lessons,
  pages,
  quantities,
  readings,
  revisions,
  searchEntries,
  searchQuantities,
  sharedEdits,
  sharedTexts,
  signOffs,
} from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import { type PageRow, changePage, dropJobs, editionsHolding, insertPages, pageSummary } from './queries.ts';
import { existingPage, placeToDraw } from './service.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

/** A double-page spread becomes two pages: the page itself its left half, a new one behind it the right. Both are read. */
export function dividePage(
  tools: Tools,
  who: Who,
  { pageId, cutShare }: { pageId: string; cutShare: number },
): PageSummary[] {
  const page = existingPage(tools.db, pageId);
  if (page.half !== 'whole') throw new AppError('cannot-do', 'This page is half of a spread already.');
  refuseWorkedOn(tools.db, page);
  const right = tools.db.transaction((tx) => {
    moveLaterPages(tx, page, 1);
    const { manualId, sourceId, sourcePage, position, label } = page;
    const made = { id: randomUUID(), manualId, sourceId, sourcePage, state: 'waiting' as const };
    insertPages(tx, [{ ...made, position: position + 1, label: `${label} right`, half: 'right', cutShare }]);
    changePage(tx, pageId, { half: 'left', cutShare, label: `${label} left` });
    drawAnew(tools, tx, page);
    tools.announce(tx, 'page.added', { subjectId: made.id, manualId, place: placeToDraw(position + 1) });
    record(tx, who, { did: 'divided a spread', subject: label, subjectId: pageId, details: { cutShare } });
    return made.id;
  });
  tell(tools, page.manualId);
  return [pageId, right].map((id) => pageSummary(existingPage(tools.db, id)));
}

/** Takes a division back. What only the machine made of the halves goes; work of people keeps it from being taken back. */
export function joinPage(tools: Tools, who: Who, pageId: string): PageSummary {
  const page = existingPage(tools.db, pageId);
  const halves = tools.db
    .select()
    .from(pages)
    .where(and(eq(pages.sourceId, page.sourceId), eq(pages.sourcePage, page.sourcePage)))
    .all();
  const [left, right] = (['left', 'right'] as const).map((side) => halves.find(({ half }) => half === side));
  if (left === undefined || right === undefined) throw new AppError('cannot-do', 'This page is no half of a spread.');
  for (const half of halves) refuseWorkedOn(tools.db, half);
  tools.db.transaction((tx) => {
    removePage(tx, right, left.id);
    moveLaterPages(tx, right, -1);
    const label = left.label.replace(/ left$/, '');
    changePage(tx, left.id, { half: 'whole', cutShare: null, label });
    drawAnew(tools, tx, left);
    record(tx, who, { did: 'joined the halves of a spread', subject: label, subjectId: left.id });
  });
  tell(tools, left.manualId);
  return pageSummary(existingPage(tools.db, left.id));
}

function refuseWorkedOn(db: Connection, { id, state, label }: PageRow): void {
  const isBeingWritten =
    db.select({ id: sharedEdits.id }).from(sharedEdits).where(eq(sharedEdits.pageId, id)).limit(1).get() !== undefined;
  if (state === 'corrected' || state === 'proofed' || isBeingWritten)
    throw new AppError(
      'cannot-do',
      `Somebody has worked on page ${label}. Restore its first revision by hand if that is to go.`,
    );
  const [edition] = editionsHolding(db, id);
  if (edition !== undefined)
    throw new AppError(
      'cannot-do',
      `Page ${label} is in edition ${edition} of this manual, which is published: it has to stay as it is.`,
    );
}

function tell({ wake, live }: Tools, manualId: string): void {
  wake();
  live.emit({ type: 'pages', manualId });
}

const moveLaterPages = (tx: Connection, { manualId, position }: PageRow, by: 1 | -1): unknown =>
  tx
    .update(pages)
    .set({ position: sql`${pages.position} + ${by}` })
    .where(and(eq(pages.manualId, manualId), gt(pages.position, position)))
    .run();

function drawAnew({ announce }: Tools, tx: Connection, page: PageRow): void {
  dropJobs(tx, [page.id]);
  changePage(tx, page.id, { drawnKey: null, layerKey: null, problem: null, state: 'waiting', warnings: [] });
  announce(tx, 'page.added', { subjectId: page.id, manualId: page.manualId, place: placeToDraw(page.position) });
}

/** All that was made of a page goes with it; a quantity that stood on it stands on its other half from then on. */
function removePage(tx: Connection, { id }: PageRow, heirId: string): void {
  tx.update(quantities).set({ pageId: heirId }).where(eq(quantities.pageId, id)).run();
  tx.delete(jobs).where(eq(jobs.subjectId, id)).run();
  tx.delete(searchEntries).where(eq(searchEntries.pageId, id)).run();
  tx.delete(searchQuantities).where(eq(searchQuantities.pageId, id)).run();
  tx.delete(comments).where(eq(comments.pageId, id)).run();
  tx.delete(lessons).where(eq(lessons.pageId, id)).run();
  tx.delete(sharedEdits).where(eq(sharedEdits.pageId, id)).run();
  tx.delete(sharedTexts).where(eq(sharedTexts.pageId, id)).run();
  tx.delete(signOffs).where(eq(signOffs.pageId, id)).run();
  tx.delete(revisions).where(eq(revisions.pageId, id)).run();
  tx.delete(readings).where(eq(readings.pageId, id)).run();
  tx.delete(pages).where(eq(pages.id, id)).run();
}
