import type { Logger } from 'pino';
import type { Config } from '#server/config/config.ts';
import type { Database } from '#server/db/database.ts';
import type BetterSqlite3 from 'better-sqlite3';
import type { Announce } from '#server/jobs/events.ts';
import type { LiveEvents } from '#server/jobs/live-events.ts';
import type { FileStore } from '#server/storage/file-store.ts';

/** What every service is handed. Nothing is looked up globally, so a test can hold each of these. */
export type Tools = {
  config: Config;
  db: Database;
  /** For full-text search, which Drizzle has no words for. */
  raw: BetterSqlite3.Database;
  files: FileStore;
  announce: Announce;
  live: LiveEvents;
  /** Tells the queue that there may be work. */
  wake: () => void;
  now: () => Date;
  log: Logger;
};
