import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { PlacedText } from '#shared/document/text-of.ts';

/**
 * What can be found: each page's text once, and each row of its parts lists. All of it is derived from the current
 * documents and can be made again. Two full-text tables (words, and runs of three letters) follow it by triggers.
 */
export const searchEntries = sqliteTable(
  'search_entries',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    kind: text().$type<'text' | 'part'>().notNull(),
    pageId: text('page_id').notNull(),
    manualId: text('manual_id').notNull(),
    body: text().notNull(),
    /** The same text in stretches, each with its place on the scan. */
    placed: text({ mode: 'json' }).$type<PlacedText[]>().notNull(),
  },
  (table) => [index('search_entries_of_a_page').on(table.pageId)],
);

/** Every quantity printed on a page, under a normal form that is the same however it was written. */
export const searchQuantities = sqliteTable(
  'search_quantities',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    key: text().notNull(),
    pageId: text('page_id').notNull(),
    manualId: text('manual_id').notNull(),
    start: integer().notNull(),
    end: integer().notNull(),
  },
  (table) => [index('search_quantities_by_key').on(table.key), index('search_quantities_of_a_page').on(table.pageId)],
);
