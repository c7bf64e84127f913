import type { Database } from '#server/db/database.ts';

/** A database, or the transaction on it that a change is part of. */
export type Connection = Database | Parameters<Parameters<Database['transaction']>[0]>[0];

type Subject = {
  subjectId: string;
  manualId: string;
  place?: number;
  priority?: number;
  wish?: Record<string, unknown>;
};

/** What has happened to a page. */
export type EventName = 'page.added' | 'page.drawn' | 'words.read' | 'revision.saved';

/** The steps of a page's trip. Heavy ones run in worker processes, light ones in the server. */
export type StepName = 'draw-page' | 'read-page' | 'structure-page' | 'index-page';

export type Pipeline = Record<EventName, StepName>;

/** Says what has happened, as part of the change itself: the next step is queued in the same transaction. */
export type Announce = (connection: Connection, name: EventName, subject: Subject) => void;
