import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import type { PageState, PageSummary } from '#shared/api/pages.ts';
import type { RecipeWish } from '#shared/reading/reading.ts';
import { AppError } from '#shared/kit/app-error.ts';
import { manuals } from '#server/db/schema/index.ts';
import { record } from '#server/features/accounts/index.ts';
import { type AddPages, existingManual } from '#server/features/manuals/index.ts';
import { hurry } from '#server/jobs/queue.ts';
import type { Announce, Connection } from '#server/jobs/events.ts';
import type { SignedIn } from '#server/http/session.ts';
import type { Tools } from '#server/http/tools.ts';
import {
  type PageRow,
  changePage,
  dropJobs,
  findPage,
  insertPages,
  lastPosition,
  pageSummary,
  pagesInState,
} from './queries.ts';

type Who = Pick<SignedIn, 'id' | 'name'>;

/** Drawing runs this many pages ahead of reading, so that the strip fills with pictures while words follow. */
const drawnAhead = 3;
export const placeToDraw = (position: number): number => (position - drawnAhead) * 2;
export const placeToRead = (position: number): number => position * 2 + 1;

/** The page, or a 404: also when its manual lies in the bin. */
export function existingPage(db: Connection, id: string): PageRow {
  const row = findPage(db, id);
  if (row === undefined) throw new AppError('not-found', 'There is no such page.');
  existingManual(db, row.manualId);
  return row;
}

/** Adds a source's pages behind those the manual has, and queues the first step of each one's trip. */
export const addPagesBy =
  (announce: Announce): AddPages =>
  (connection, source, pageCount) => {
    const first = lastPosition(connection, source.manualId) + 1;
    const rows = Array.from({ length: pageCount }, (_, sourcePage) => ({
      id: randomUUID(),
      manualId: source.manualId,
      sourceId: source.id,
      sourcePage,
      position: first + sourcePage,
      label: String(first + sourcePage),
      state: 'waiting' as const,
    }));
    insertPages(connection, rows);
    for (const { id, manualId, position } of rows) {
      announce(connection, 'page.added', { subjectId: id, manualId, place: placeToDraw(position) });
    }
  };

/** The state that a page comes back to when nothing is being done with it. */
export const restingState = (row: PageRow): PageState => {
  if (row.state === 'corrected' || row.state === 'proofed') return row.state;
  return row.revision > 0 ? 'read' : 'waiting';
};

export function tellPage({ db, live }: Pick<Tools, 'db' | 'live'>, pageId: string): void {
  const row = findPage(db, pageId);
  if (row !== undefined) live.emit({ type: 'page', manualId: row.manualId, page: pageSummary(row) });
}

export function relabel(tools: Tools, who: Who, { pageId, label }: { pageId: string; label: string }): PageSummary {
  const row = existingPage(tools.db, pageId);
  tools.db.transaction((tx) => {
    changePage(tx, pageId, { label });
    record(tx, who, { did: 'relabelled a page', subject: label, subjectId: pageId, details: { was: row.label } });
  });
  tellPage(tools, pageId);
  return pageSummary(existingPage(tools.db, pageId));
}

/** Reads a page again from the picture on. What people wrote on it stays: see the step that makes the document. */
export function readAgain(
  tools: Tools,
  who: Who,
  { pageId, wish }: { pageId: string; wish: RecipeWish | undefined },
): PageSummary {
  const row = existingPage(tools.db, pageId);
  tools.db.transaction((tx) => {
    queueReading(tools, tx, { row, wish });
    record(tx, who, {
      did: 'asked for a page to be read again',
      subject: row.label,
      subjectId: pageId,
      details: { wish: wish ?? {} },
    });
  });
  tools.wake();
  tellPage(tools, pageId);
  return pageSummary(existingPage(tools.db, pageId));
}

type Again = { row: PageRow; wish?: RecipeWish | undefined };

function queueReading({ announce }: Tools, tx: Connection, { row, wish }: Again): void {
  dropJobs(tx, [row.id]);
  const subject = { subjectId: row.id, manualId: row.manualId, place: placeToRead(row.position) };
  if (row.drawnKey === null) announce(tx, 'page.added', { ...subject, place: placeToDraw(row.position) });
  else announce(tx, 'page.drawn', { ...subject, ...(wish === undefined ? {} : { wish }) });
  changePage(tx, row.id, {
    problem: null,
    ...(row.state === 'failed' || row.state === 'reading' ? { state: row.revision > 0 ? 'read' : 'waiting' } : {}),
  });
}

export function attend({ db, wake }: Tools, pageId: string): void {
  existingPage(db, pageId);
  hurry(db, pageId);
  wake();
}

const deeds = {
  pause: 'paused the reading of a manual',
  resume: 'resumed the reading of a manual',
  cancel: 'cancelled the reading of a manual',
  retry: 'tried the failed pages of a manual again',
} as const;

/** Pauses, resumes or cancels the reading of a manual, or tries its failed pages again; says how many pages that touches. */
export function steerReading(
  tools: Tools,
  who: Who,
  { manualId, what }: { manualId: string; what: keyof typeof deeds },
): { pages: number } {
  const { db } = tools;
  const manual = existingManual(db, manualId);
  const touched = pagesInState(db, manualId, what === 'retry' ? ['failed'] : ['waiting', 'reading']);
  db.transaction((tx) => {
    if (what === 'pause' || what === 'resume') {
      tx.update(manuals)
        .set({ readingPaused: what === 'pause' })
        .where(eq(manuals.id, manualId))
        .run();
    }
    for (const row of touched) {
      if (what === 'cancel') cancelPage(tx, row);
      if (what === 'retry') queueReading(tools, tx, { row });
    }
    record(tx, who, {
      did: deeds[what],
      subject: manual.title,
      subjectId: manualId,
      details: { pages: touched.length },
    });
  });
  tools.wake();
  tools.live.emit({ type: 'pages', manualId });
  return { pages: touched.length };
}

function cancelPage(tx: Connection, row: PageRow): void {
  dropJobs(tx, [row.id]);
  if (row.revision > 0) changePage(tx, row.id, { state: 'read' });
  else changePage(tx, row.id, { state: 'failed', problem: 'Reading was cancelled. Try again when you want it read.' });
}
