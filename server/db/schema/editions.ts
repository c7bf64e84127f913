import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { EditionStanding } from '#shared/api/editions.ts';
import type { PageState } from '#shared/api/pages.ts';
import type { Quantity } from '#shared/api/quantities.ts';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import { manuals } from './manuals.ts';
import { pages } from './pages.ts';

/** A published state of a manual. Nothing of it changes but that it can be withdrawn, with a reason. */
export const editions = sqliteTable(
  'editions',
  {
    id: text().primaryKey(),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    number: integer().notNull(),
    name: text().notNull(),
    note: text().notNull(),
    publishedBy: text('published_by').notNull(),
    publishedById: text('published_by_id').notNull(),
    publishedAt: integer('published_at', { mode: 'timestamp_ms' }).notNull(),
    /** What was known against it when it was published. */
    standing: text({ mode: 'json' }).$type<EditionStanding>().notNull(),
    quantities: text({ mode: 'json' }).$type<Quantity[]>().notNull(),
    plan: text({ mode: 'json' }).$type<FrequencyPlan>().notNull(),
    withdrawnBy: text('withdrawn_by'),
    withdrawnAt: integer('withdrawn_at', { mode: 'timestamp_ms' }),
    withdrawnReason: text('withdrawn_reason'),
  },
  (table) => [uniqueIndex('one_edition_of_a_number').on(table.manualId, table.number)],
);

/** Which revision of each page an edition holds. The text itself stands in the revision, which is never changed again. */
export const editionPages = sqliteTable(
  'edition_pages',
  {
    editionId: text('edition_id')
      .notNull()
      .references(() => editions.id),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    position: integer().notNull(),
    label: text().notNull(),
    state: text().$type<PageState>().notNull(),
    revision: integer().notNull(),
    doubtCount: integer('doubt_count').notNull(),
    signedBy: text('signed_by'),
    signedAt: integer('signed_at', { mode: 'timestamp_ms' }),
  },
  (table) => [
    primaryKey({ columns: [table.editionId, table.pageId] }),
    index('editions_of_a_page').on(table.pageId, table.revision),
  ],
);
