import { blob, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
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
    /** Who wrote last, of those that `author` names. */
    authorId: text('author_id'),
    /** All that `author` names; none where the machine made it. */
    authorIds: text('author_ids', { mode: 'json' }).$type<string[]>().notNull().default([]),
    readingId: integer('reading_id'),
    note: text().notNull(),
    doubtCount: integer('doubt_count').notNull(),
    document: text({ mode: 'json' }).$type<PageDocument>().notNull(),
    savedAt: integer('saved_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (table) => [uniqueIndex('one_revision_of_a_number').on(table.pageId, table.number)],
);

/** Who read a revision of a page through and found it right. Kept for good: one that was taken back says who did so. */
export const signOffs = sqliteTable(
  'sign_offs',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    revision: integer().notNull(),
    signedBy: text('signed_by').notNull(),
    signedById: text('signed_by_id').notNull(),
    signedAt: integer('signed_at', { mode: 'timestamp_ms' }).notNull(),
    /** Doubts that were left, and known to who signed. */
    doubtCount: integer('doubt_count').notNull(),
    takenBackBy: text('taken_back_by'),
    takenBackAt: integer('taken_back_at', { mode: 'timestamp_ms' }),
  },
  (table) => [index('sign_offs_of_a_page').on(table.pageId, table.revision)],
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

/** The text of a page as people share it while they correct it (Yjs). It is made when the first of them opens the page. */
export const sharedTexts = sqliteTable('shared_texts', {
  pageId: text('page_id')
    .primaryKey()
    .references(() => pages.id),
  /** The document version that the text was last written by. */
  version: integer().notNull(),
  /** As it was when the page's current revision was made; what came since stands in the edits. */
  state: blob({ mode: 'buffer' }).notNull(),
});

/** What people wrote since the page's last revision, each edit kept before the one who made it is told so. */
export const sharedEdits = sqliteTable(
  'shared_edits',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    edit: blob({ mode: 'buffer' }).notNull(),
    userId: text('user_id').notNull(),
  },
  (table) => [index('shared_edits_of_a_page').on(table.pageId, table.id)],
);
