import { type AnySQLiteColumn, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { CommentKind } from '#shared/api/comments.ts';
import type { Anchor } from '#shared/document/find-anchor.ts';
import { pages } from './pages.ts';

/** Comments and questions on pages. A reply names the comment that it answers; only that one has an anchor and a state. */
export const comments = sqliteTable(
  'comments',
  {
    id: text().primaryKey(),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    threadId: text('thread_id').references((): AnySQLiteColumn => comments.id, { onDelete: 'cascade' }),
    kind: text().$type<CommentKind>().notNull(),
    anchor: text({ mode: 'json' }).$type<Anchor>(),
    words: text().notNull(),
    /** Ids of the people who are called by name in the words. */
    mentions: text({ mode: 'json' }).$type<string[]>().notNull().default([]),
    authorId: text('author_id').notNull(),
    author: text().notNull(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    editedAt: integer('edited_at', { mode: 'timestamp_ms' }),
    deletedAt: integer('deleted_at', { mode: 'timestamp_ms' }),
    resolvedAt: integer('resolved_at', { mode: 'timestamp_ms' }),
    resolvedBy: text('resolved_by'),
  },
  (table) => [
    index('comments_of_a_page').on(table.pageId, table.createdAt),
    index('replies_of_a_comment').on(table.threadId),
  ],
);
