import { and, asc, desc, eq, inArray, lte, notInArray, sql } from 'drizzle-orm';
import { jobs, manuals } from '#server/db/schema/index.ts';
import type { Announce, Connection, Pipeline, StepName } from './events.ts';

export type Job = typeof jobs.$inferSelect & { step: StepName };

/** Tried this often, a job that keeps failing for want of luck (a crash, a time limit) is given up and shown. */
export const mostAttempts = 3;
const retryDelayMs = 2000;
/** The priority of work on a page that somebody has open. */
export const watched = 100;

/** Queues the step that follows an event. A job that waits already is left; one that failed is woken; both keep one row. */
export const announceBy =
  (pipeline: Pipeline): Announce =>
  (connection, name, { subjectId, manualId, place = 0, priority = 0, notBefore = 0, wish }) => {
    const fresh = { state: 'waiting' as const, attempts: 0, notBefore, problem: null, wish: wish ?? null };
    connection
      .insert(jobs)
      .values({ step: pipeline[name], subjectId, manualId, place, priority, ...fresh })
      .onConflictDoUpdate({ target: [jobs.step, jobs.subjectId], set: { ...fresh, place } })
      .run();
  };

/** Takes the next job of the given steps, or undefined. Work of a paused or binned manual stays where it is. */
export function claim(db: Connection, steps: readonly StepName[], nowMs: number): Job | undefined {
  const resting = db
    .select({ id: manuals.id })
    .from(manuals)
    .where(sql`${manuals.readingPaused} = 1 or ${manuals.deletedAt} is not null`);
  const next = db
    .select()
    .from(jobs)
    .where(
      and(
        eq(jobs.state, 'waiting'),
        inArray(jobs.step, [...steps]),
        lte(jobs.notBefore, nowMs),
        notInArray(jobs.manualId, resting),
      ),
    )
    .orderBy(desc(jobs.priority), asc(jobs.place), asc(jobs.id))
    .limit(1)
    .get();
  if (next === undefined) return undefined;
  db.update(jobs)
    .set({ state: 'active', attempts: next.attempts + 1 })
    .where(eq(jobs.id, next.id))
    .run();
  return { ...next, attempts: next.attempts + 1, state: 'active' } as Job;
}

/** Whether the job still stands as this worker took it: it may have been cancelled or asked for anew meanwhile. */
export const stillMine = (db: Connection, job: Job): boolean =>
  db.select({ state: jobs.state }).from(jobs).where(eq(jobs.id, job.id)).get()?.state === 'active';

export const finish = (db: Connection, job: Job): void => {
  db.delete(jobs)
    .where(and(eq(jobs.id, job.id), eq(jobs.state, 'active')))
    .run();
};

/** Puts a job back for another try, or to rest with its problem when it is hopeless or was tried often enough. */
export function giveBack(
  db: Connection,
  job: Job,
  { problem, hopeless, nowMs }: { problem: string; hopeless: boolean; nowMs: number },
): 'again' | 'failed' {
  const isOver = hopeless || job.attempts >= mostAttempts;
  db.update(jobs)
    .set(
      isOver
        ? { state: 'failed', problem }
        : { state: 'waiting', problem, notBefore: nowMs + retryDelayMs * job.attempts },
    )
    .where(and(eq(jobs.id, job.id), eq(jobs.state, 'active')))
    .run();
  return isOver ? 'failed' : 'again';
}

/** After a stop or a crash of the server: what was being done waits again, and the interrupted try does not count. */
export const requeueInterrupted = (db: Connection): number =>
  db
    .update(jobs)
    .set({ state: 'waiting', attempts: sql`max(0, ${jobs.attempts} - 1)`, notBefore: 0 })
    .where(eq(jobs.state, 'active'))
    .run().changes;

/** Somebody looks at a page: all its work goes first. */
export const hurry = (db: Connection, subjectId: string): void => {
  db.update(jobs).set({ priority: watched }).where(eq(jobs.subjectId, subjectId)).run();
};

/** What waits or is under way of the heavy steps, for the health route and the queue's display. */
export function queueCounts(db: Connection): { waiting: number; active: number } {
  const rows = db
    .select({ state: jobs.state, count: sql<number>`count(*)` })
    .from(jobs)
    .where(inArray(jobs.step, ['draw-page', 'read-page']))
    .groupBy(jobs.state)
    .all();
  const of = (state: string): number => rows.find((row) => row.state === state)?.count ?? 0;
  return { waiting: of('waiting'), active: of('active') };
}
