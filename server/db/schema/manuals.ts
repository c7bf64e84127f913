import { integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { sourceStates } from '#shared/api/sources.ts';

export const manuals = sqliteTable('manuals', {
  id: text().primaryKey(),
  title: text().notNull(),
  equipment: text(),
  maker: text(),
  documentNumber: text('document_number'),
  editionDate: text('edition_date'),
  createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
  createdBy: text('created_by').notNull(),
  deletedAt: integer('deleted_at', { mode: 'timestamp_ms' }),
  /** Whether what people correct settles and raises doubts on the manual's other pages. */
  learns: integer({ mode: 'boolean' }).notNull().default(true),
  /** Units as this manual writes them, beyond those that every manual may use. */
  ownUnits: text('own_units', { mode: 'json' }).$type<string[]>().notNull().default([]),
  readingPaused: integer('reading_paused', { mode: 'boolean' }).notNull().default(false),
});

/** A file as uploaded. The bytes lie in the store under the SHA-256. */
export const sources = sqliteTable(
  'sources',
  {
    id: text().primaryKey(),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    fileName: text('file_name').notNull(),
    sha256: text().notNull(),
    bytes: integer().notNull(),
    mediaType: text('media_type').notNull(),
    pageCount: integer('page_count'),
    state: text().$type<(typeof sourceStates)[number]>().notNull(),
    problem: text(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    createdBy: text('created_by').notNull(),
  },
  (table) => [uniqueIndex('one_source_of_the_same_bytes').on(table.manualId, table.sha256)],
);
