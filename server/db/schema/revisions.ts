import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { revisionOrigins } from '#shared/api/revisions.ts';
import type { PageDocument } from '#shared/document/page-document.ts';
import type { Lessons } from '#shared/reading/lessons.ts';
import { pages } from './pages.ts';

export const revisions = sqliteTable(
  'revisions',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    number: integer().notNull(),
    origin: text().$type<(typeof revisionOrigins)[number]>().notNull(),
    author: text().notNull(),
    authorId: text('author_id'),
    readingId: integer('reading_id'),
    note: text().notNull(),
    doubtCount: integer('doubt_count').notNull(),
    document: text({ mode: 'json' }).$type<PageDocument>().notNull(),
    savedAt: integer('saved_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (table) => [uniqueIndex('one_revision_of_a_number').on(table.pageId, table.number)],
);

/** What each corrected page teaches about its manual; follows from its document and its reading. */
export const lessons = sqliteTable(
  'lessons',
  {
    pageId: text('page_id')
      .primaryKey()
      .references(() => pages.id),
    manualId: text('manual_id').notNull(),
    content: text({ mode: 'json' }).$type<Lessons>().notNull(),
  },
  (table) => [index('lessons_of_a_manual').on(table.manualId)],
);
