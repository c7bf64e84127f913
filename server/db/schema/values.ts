import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { QuantityDefinition } from '#shared/calc/quantity.ts';
import type { Zone } from '#shared/document/define-block.ts';
import type { FrequencyPlan } from '#shared/plan/plan.ts';
import { manuals } from './manuals.ts';

export const quantities = sqliteTable(
  'quantities',
  {
    id: text().primaryKey(),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    symbol: text().notNull(),
    definition: text({ mode: 'json' }).$type<QuantityDefinition>().notNull(),
    pageId: text('page_id'),
    zone: text({ mode: 'json' }).$type<Zone>(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (table) => [uniqueIndex('one_quantity_of_a_symbol').on(table.manualId, table.symbol)],
);

export const settings = sqliteTable(
  'settings',
  {
    id: text().primaryKey(),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    name: text().notNull(),
    inputs: text({ mode: 'json' }).$type<Record<string, number | string>>().notNull(),
    createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
    createdBy: text('created_by').notNull(),
  },
  (table) => [index('settings_of_a_manual').on(table.manualId)],
);

/** The signal chain of a manual's equipment. One a manual; each change has the number that it was based upon. */
export const frequencyPlans = sqliteTable('frequency_plans', {
  manualId: text('manual_id')
    .primaryKey()
    .references(() => manuals.id),
  number: integer().notNull(),
  content: text({ mode: 'json' }).$type<FrequencyPlan>().notNull(),
  savedAt: integer('saved_at', { mode: 'timestamp_ms' }).notNull(),
  savedBy: text('saved_by').notNull(),
});

/** What editors said of proposed relations: a dismissed one is not proposed again. */
export const relationVerdicts = sqliteTable(
  'relation_verdicts',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    manualId: text('manual_id')
      .notNull()
      .references(() => manuals.id),
    relation: text().notNull(),
    verdict: text().$type<'accepted' | 'dismissed'>().notNull(),
    saidBy: text('said_by').notNull(),
    saidAt: integer('said_at', { mode: 'timestamp_ms' }).notNull(),
  },
  (table) => [uniqueIndex('one_verdict_of_a_relation').on(table.manualId, table.relation)],
);
