import type BetterSqlite3 from 'better-sqlite3';
import { and, eq, inArray, isNull, like, or, sql } from 'drizzle-orm';
import { manuals, pages, quantities, searchEntries, searchQuantities } from '#server/db/schema/index.ts';
import type { Connection } from '#server/jobs/events.ts';

export type EntryRow = typeof searchEntries.$inferSelect;
export type Found = { id: number; score: number };
export type Wanted = {
  expression: string;
  kind: 'text' | 'part' | undefined;
  manualId: string | undefined;
  limit: number;
};

export function replaceEntries(
  db: Connection,
  pageId: string,
  fresh: { entries: (typeof searchEntries.$inferInsert)[]; quantities: (typeof searchQuantities.$inferInsert)[] },
): void {
  db.delete(searchEntries).where(eq(searchEntries.pageId, pageId)).run();
  db.delete(searchQuantities).where(eq(searchQuantities.pageId, pageId)).run();
  for (const entry of fresh.entries) db.insert(searchEntries).values(entry).run();
  for (const quantity of fresh.quantities) db.insert(searchQuantities).values(quantity).run();
}

/** Entries that match a full-text expression, best first (bm25: lower is better, so it is turned round). */
export function matching(
  raw: BetterSqlite3.Database,
  table: 'search_words' | 'search_trigrams',
  wanted: Wanted,
): Found[] {
  const { expression, kind = null, manualId = null, limit } = wanted;
  return raw
    .prepare(
      `select entry.id as id, -bm25(${table}) as score
         from ${table}
         join search_entries entry on entry.id = ${table}.rowid
         join manuals on manuals.id = entry.manual_id and manuals.deleted_at is null
        where ${table} match @expression
          and (@kind is null or entry.kind = @kind)
          and (@manualId is null or entry.manual_id = @manualId)
        order by bm25(${table}), entry.id
        limit @limit`,
    )
    .all({ expression, kind, manualId, limit }) as Found[];
}

export const entriesOf = (db: Connection, ids: number[]): EntryRow[] =>
  db.select().from(searchEntries).where(inArray(searchEntries.id, ids)).all();

export const pageEntries = (db: Connection, pageIds: string[]): EntryRow[] =>
  db
    .select()
    .from(searchEntries)
    .where(and(inArray(searchEntries.pageId, pageIds), eq(searchEntries.kind, 'text')))
    .all();

export const quantityPlaces = (db: Connection, key: string, manualId: string | undefined) =>
  db
    .select({ pageId: searchQuantities.pageId, start: searchQuantities.start, end: searchQuantities.end })
    .from(searchQuantities)
    .innerJoin(manuals, and(eq(manuals.id, searchQuantities.manualId), isNull(manuals.deletedAt)))
    .where(
      and(eq(searchQuantities.key, key), manualId === undefined ? undefined : eq(searchQuantities.manualId, manualId)),
    )
    .limit(1000)
    .all();

/** Named quantities whose symbol or label has the text in it. */
export const quantitiesCalled = (db: Connection, text: string, manualId: string | undefined) => {
  const pattern = `%${text.replace(/[\\%_]/g, '\\$&')}%`;
  return db
    .select({ quantity: quantities, manualTitle: manuals.title })
    .from(quantities)
    .innerJoin(manuals, and(eq(manuals.id, quantities.manualId), isNull(manuals.deletedAt)))
    .where(
      and(
        or(
          like(quantities.symbol, pattern),
          sql`json_extract(${quantities.definition}, '$.label') like ${pattern} escape '\\'`,
        ),
        manualId === undefined ? undefined : eq(quantities.manualId, manualId),
      ),
    )
    .limit(20)
    .all();
};

export const pageTitles = (db: Connection, pageIds: string[]) =>
  new Map(
    db
      .select({ id: pages.id, label: pages.label, manualTitle: manuals.title })
      .from(pages)
      .innerJoin(manuals, eq(manuals.id, pages.manualId))
      .where(inArray(pages.id, pageIds))
      .all()
      .map((row) => [row.id, row] as const),
  );
