import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

/** Work that waits or is being done. A row goes when its work is done; one that failed rests here until tried again. */
export const jobs = sqliteTable(
  'jobs',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    step: text().notNull(),
    /** The page, source or manual that the work is about; one job a step and subject. */
    subjectId: text('subject_id').notNull(),
    manualId: text('manual_id').notNull(),
    state: text().$type<'waiting' | 'active' | 'failed'>().notNull().default('waiting'),
    /** Work on what somebody is looking at has a higher one. */
    priority: integer().notNull().default(0),
    /** Within a priority, lower goes first. */
    place: integer().notNull().default(0),
    attempts: integer().notNull().default(0),
    notBefore: integer('not_before').notNull().default(0),
    wish: text({ mode: 'json' }).$type<Record<string, unknown>>(),
    problem: text(),
  },
  (table) => [
    uniqueIndex('one_job_of_a_step_and_subject').on(table.step, table.subjectId),
    index('jobs_in_order').on(table.state, table.priority, table.place),
  ],
);
