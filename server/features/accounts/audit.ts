import { desc } from 'drizzle-orm';
import type { Connection } from '#server/jobs/events.ts';
import { audit } from '#server/db/schema/index.ts';
import type { SignedIn } from '#server/http/session.ts';

type Deed = { did: string; subject: string; subjectId?: string; details?: Record<string, unknown> };

/** Writes one line of the audit trail, as part of the change it speaks of. */
export function record(connection: Connection, who: Pick<SignedIn, 'id' | 'name'>, deed: Deed): void {
  connection
    .insert(audit)
    .values({
      at: new Date(),
      userId: who.id,
      who: who.name,
      did: deed.did,
      subject: deed.subject,
      subjectId: deed.subjectId ?? null,
      details: deed.details ?? {},
    })
    .run();
}

export const auditRows = (connection: Connection, limit: number, offset: number) =>
  connection.select().from(audit).orderBy(desc(audit.id)).limit(limit).offset(offset).all();
