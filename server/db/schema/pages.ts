import { index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { PageHalf, PageState } from '#shared/api/pages.ts';
import type { Reading } from '#shared/reading/reading.ts';
import type { ReadingWarning } from '#shared/reading/page-warning.ts';
import { manuals, sources } from './manuals.ts';

export const pages = sqliteTable(
  'pages',
  {
    id: text().primaryKey(),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    sourceId: text('source_id')
      .notNull()
      .references(() => sources.id),
    sourcePage: integer('source_page').notNull(),
    /** A double-page spread that was divided gives two pages, one of each half. */
    half: text().$type<PageHalf>().notNull().default('whole'),
    /** Where the spread was divided, as a share of its width. */
    cutShare: real('cut_share'),
    position: integer().notNull(),
    label: text().notNull(),
    state: text().$type<PageState>().notNull(),
    problem: text(),
    /** The picture as drawn from the source, before any straightening. */
    drawnKey: text('drawn_key'),
    drawnDpi: real('drawn_dpi'),
    /** The words that the source itself carries for this page, where it has any. */
    layerKey: text('layer_key'),
    /** The picture as read: upright and straight. Boxes are in its pixels. */
    imageKey: text('image_key'),
    width: integer(),
    height: integer(),
    readingId: integer('reading_id'),
    confidence: real(),
    revision: integer().notNull().default(0),
    doubtCount: integer('doubt_count').notNull().default(0),
    /** What the last reading found wrong with the picture. */
    warnings: text({ mode: 'json' }).$type<ReadingWarning[]>().notNull().default([]),
  },
  (table) => [
    uniqueIndex('one_page_of_a_source_page').on(table.sourceId, table.sourcePage, table.half),
    index('pages_of_a_manual').on(table.manualId, table.position),
  ],
);

export const readings = sqliteTable(
  'readings',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    pageId: text('page_id')
      .notNull()
      .references(() => pages.id),
    imageKey: text('image_key').notNull(),
    content: text({ mode: 'json' }).$type<Reading>().notNull(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (table) => [index('readings_of_a_page').on(table.pageId)],
);
