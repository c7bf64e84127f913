import { and, asc, eq, gt, inArray } from 'drizzle-orm';
import { countDoubts } from '#shared/document/text-of.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import { type Habits, habitsFrom, lessonsOf } from '#shared/reading/lessons.ts';
import type { Reading } from '#shared/reading/reading.ts';
import { documentOf } from '#shared/reading/structure.ts';
import { taught } from '#shared/reading/teach.ts';
import { lessons, manuals, pages, revisions } from '#server/db/schema/index.ts';
import { type PageRow, changePage, editionsHolding, findPage, tellPage } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import type { LightStep } from '#server/jobs/runner.ts';
import type { Tools } from '#server/http/tools.ts';
import { documentOfPage, findReading, findRevision } from './queries.ts';
import { addRevision } from './service.ts';
import { hasPendingEdits, intoSharedText } from './shared-text.ts';

/** Corrections come in bursts; what they teach is spread once the burst is over. */
const burstMs = 3000;
/** So many pages are gone through at a time, with a rest behind them, so that the server answers in between. */
const pagesAtOnce = 5;
const breathMs = 200;

/** Gathers what a corrected page teaches, and has the manual's other pages looked at again. */
export const learnStep = (tools: Tools): LightStep => ({
  heavy: false,
  run(job) {
    const { db } = tools;
    const page = findPage(db, job.subjectId);
    if (page === undefined || !isCorrected(page)) return;
    const document = documentOfPage(db, page.id, page.revision);
    if (document === null) return;
    const revision = findRevision(db, page.id, page.revision);
    const reading = revision?.readingId === page.readingId ? readingOf(db, page) : null;
    const content = lessonsOf(document, reading);
    db.insert(lessons)
      .values({ pageId: page.id, manualId: page.manualId, content })
      .onConflictDoUpdate({ target: lessons.pageId, set: { content } })
      .run();
    spreadLessons(tools, page.manualId, { after: 0, inMs: burstMs });
  },
});

/** Queues the going through of a manual's untouched pages, from the one behind a position on. */
const spreadLessons = (
  { announce, now, db }: Tools,
  manualId: string,
  { after, inMs }: { after: number; inMs: number },
): void =>
  announce(db, 'lessons.changed', {
    subjectId: manualId,
    manualId,
    notBefore: now().getTime() + inMs,
    wish: { after },
  });

/**
 * Makes the documents of pages that nobody has touched anew, in the light of what the manual taught. They stay the same
 * revision: it is still the machine's, follows from the reading, and differs in its doubts.
 */
export const teachStep = (tools: Tools): LightStep => ({
  heavy: false,
  run(job) {
    const { db } = tools;
    const after = Number(job.wish?.['after'] ?? 0);
    const rows = db
      .select()
      .from(pages)
      .where(and(eq(pages.manualId, job.subjectId), eq(pages.state, 'read'), gt(pages.position, after)))
      .orderBy(asc(pages.position))
      .limit(pagesAtOnce)
      .all();
    const habits = habitsOfManual(db, job.subjectId);
    for (const page of rows) if (teachPage(tools, page, habits)) setImmediate(() => tellPage(tools, page.id));
    const last = rows.at(-1);
    if (last !== undefined && rows.length === pagesAtOnce)
      spreadLessons(tools, job.subjectId, { after: last.position, inMs: breathMs });
  },
});

function teachPage(tools: Tools, page: PageRow, habits: Habits): boolean {
  const { db } = tools;
  const reading = readingOf(db, page);
  const revision = findRevision(db, page.id, page.revision);
  if (reading === null || revision?.origin !== 'machine' || revision.readingId !== page.readingId) return false;
  const made = machineDocument(reading, habits);
  if (JSON.stringify(made) === JSON.stringify(revision.document) || hasPendingEdits(db, page.id)) return false;
  if (editionsHolding(db, page.id, revision.number).length > 0) {
    // What is published stays as it is: here the machine makes a revision of its own.
    const note = 'Read in the light of corrected pages';
    addRevision(tools, db, { page, who: null, note, document: made, origin: 'machine' });
    return true;
  }
  const document = intoSharedText(db, page.id, { document: made });
  const doubtCount = countDoubts(document);
  db.update(revisions).set({ document, doubtCount }).where(eq(revisions.id, revision.id)).run();
  changePage(db, page.id, { doubtCount });
  return true;
}

/** The page document of a reading, in the light of what the manual's corrected pages taught. */
export const machineDocument = (reading: Reading, habits: Habits): PageDocument => taught(documentOf(reading), habits);

const nothingLearnt = habitsFrom([], []);

export function habitsOfManual(db: Connection, manualId: string): Habits {
  const manual = db.select().from(manuals).where(eq(manuals.id, manualId)).get();
  if (manual === undefined) return nothingLearnt;
  const rows = manual.learns
    ? db
        .select({ content: lessons.content })
        .from(lessons)
        .innerJoin(pages, eq(pages.id, lessons.pageId))
        .where(and(eq(lessons.manualId, manualId), inArray(pages.state, ['corrected', 'proofed'])))
        .all()
    : [];
  return habitsFrom(
    rows.map(({ content }) => content),
    manual.ownUnits,
  );
}

const isCorrected = ({ state }: PageRow): boolean => state === 'corrected' || state === 'proofed';

const readingOf = (db: Connection, { readingId }: PageRow): Reading | null =>
  readingId === null ? null : (findReading(db, readingId)?.content ?? null);
