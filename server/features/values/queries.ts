import { and, asc, eq, like } from 'drizzle-orm';
import type { ChannelTable } from '#shared/api/calculations.ts';
import type { Quantity, Setting } from '#shared/api/quantities.ts';
import { channelTablesOf } from '#shared/document/channel-tables.ts';
import { pages, quantities, revisions, settings } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type QuantityRow = typeof quantities.$inferSelect;

export const quantityRows = (db: Connection, manualId: string): QuantityRow[] =>
  db
    .select()
    .from(quantities)
    .where(eq(quantities.manualId, manualId))
    .orderBy(asc(quantities.createdAt), asc(quantities.symbol))
    .all();

export const findQuantity = (db: Connection, manualId: string, id: string): QuantityRow | undefined =>
  db
    .select()
    .from(quantities)
    .where(and(eq(quantities.manualId, manualId), eq(quantities.id, id)))
    .get();

export const quantityReply = ({ id, definition, pageId, zone }: QuantityRow): Quantity => ({
  ...definition,
  id,
  ...(pageId === null ? {} : { pageId }),
  ...(zone === null ? {} : { zone }),
});

export const settingRows = (db: Connection, manualId: string): Setting[] =>
  db
    .select()
    .from(settings)
    .where(eq(settings.manualId, manualId))
    .orderBy(asc(settings.name))
    .all()
    .map(({ id, name, inputs, createdBy, createdAt }) => ({
      id,
      name,
      inputs,
      createdBy,
      createdAt: createdAt.toISOString(),
    }));

export const findSetting = (db: Connection, manualId: string, id: string) =>
  db
    .select()
    .from(settings)
    .where(and(eq(settings.manualId, manualId), eq(settings.id, id)))
    .get();

/** The current documents of the pages that hold what is looked for, in order. */
const pagesHolding = (db: Connection, manualId: string, json: string) =>
  db
    .select({ pageId: pages.id, pageLabel: pages.label, document: revisions.document })
    .from(pages)
    .innerJoin(revisions, and(eq(revisions.pageId, pages.id), eq(revisions.number, pages.revision)))
    .where(and(eq(pages.manualId, manualId), like(revisions.document, `%${json}%`)))
    .orderBy(asc(pages.position))
    .all();

export const pagesWithLiveValues = (db: Connection, manualId: string) => pagesHolding(db, manualId, '"liveValue"');

/** The channel tables that editors have tagged on the pages of a manual; of two with one name the first counts. */
export function channelTablesOfManual(db: Connection, manualId: string): ChannelTable[] {
  const byId = new Map<string, ChannelTable>();
  for (const { pageId, pageLabel, document } of pagesHolding(db, manualId, '"kind":"channel"'))
    for (const table of channelTablesOf(document, pageLabel))
      if (!byId.has(table.id)) byId.set(table.id, { ...table, rows: table.rows.map((row) => [...row]), pageId });
  return [...byId.values()];
}
