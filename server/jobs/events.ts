import type { Database } from '#server/db/database.ts';

/** A database, or the transaction on it that a change is part of. */
export type Connection = Database | Parameters<Parameters<Database['transaction']>[0]>[0];

type Subject = {
  subjectId: string;
  manualId: string;
  place?: number;
  priority?: number;
  /** The step waits until then; milliseconds since 1970. */
  notBefore?: number;
  wish?: Record<string, unknown>;
};

/** What has happened to a page; the subject of `lessons.changed` is its manual. */
export type EventName =
  'page.added' | 'page.drawn' | 'words.read' | 'revision.saved' | 'page.corrected' | 'lessons.changed';

/** The steps of a page's trip. Heavy ones run in worker processes, light ones in the server. */
export type StepName = 'draw-page' | 'read-page' | 'structure-page' | 'index-page' | 'learn-page' | 'teach-manual';

export type Pipeline = Record<EventName, StepName>;

/** Says what has happened, as part of the change itself: the next step is queued in the same transaction. */
export type Announce = (connection: Connection, name: EventName, subject: Subject) => void;
