import { eq } from 'drizzle-orm';
import { between, movedZone } from '#shared/document/zones.ts';
import type { Transform } from '#shared/reading/reading.ts';
import { comments } from '#server/db/schema/index.ts';
import type { PageRow } from '#server/features/pages/index.ts';
import type { Connection } from '#server/jobs/events.ts';
import { findReading } from './queries.ts';

/** What people commented on lies elsewhere in a new picture of the page: the places of their comments move along. */
export function moveAnchors(tx: Connection, { id: pageId, readingId }: PageRow, to: Transform): void {
  const earlier = readingId === null ? undefined : findReading(tx, readingId);
  if (earlier === undefined) return;
  const matrix = between(earlier.content.transform, to);
  for (const { id, anchor } of tx.select().from(comments).where(eq(comments.pageId, pageId)).all()) {
    const zone = anchor?.zone ?? null;
    if (anchor === null || zone === null) continue;
    const moved = { ...anchor, zone: movedZone(zone, matrix) };
    tx.update(comments).set({ anchor: moved }).where(eq(comments.id, id)).run();
  }
}
