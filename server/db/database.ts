import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import BetterSqlite3 from 'better-sqlite3';
import { type BetterSQLite3Database, drizzle } from 'drizzle-orm/better-sqlite3';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import * as schema from './schema/index.ts';

export type Database = BetterSQLite3Database<typeof schema>;
export type OpenDatabase = { db: Database; raw: BetterSqlite3.Database; close: () => void };

/** The built server lies in dist/server and this file in server/db, so the project's root is two folders up from either. */
export const projectRoot = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/** Opens the database file, making it when missing, and brings its tables up to date. */
export function openDatabase(dataDir: string): OpenDatabase {
  mkdirSync(dataDir, { recursive: true });
  const raw = new BetterSqlite3(path.join(dataDir, 'benchleaf.sqlite'));
  raw.pragma('journal_mode = WAL');
  raw.pragma('busy_timeout = 5000');
  const db = drizzle(raw, { schema });
  moveUp(raw, db);
  return { db, raw, close: () => raw.close() };
}

/**
 * Rebuilding a table drops the old one, and the drop would cascade into its children: the pragma inside a migration is
 * ignored there, because the migrator works in a transaction. So foreign keys go off before and are checked after.
 */
function moveUp(raw: BetterSqlite3.Database, db: Database): void {
  raw.pragma('foreign_keys = OFF');
  migrate(db, { migrationsFolder: path.join(projectRoot, 'drizzle') });
  const broken = raw.pragma('foreign_key_check') as unknown[];
  if (broken.length > 0) throw new Error(`After moving the database up, ${broken.length} rows point at nothing.`);
  raw.pragma('foreign_keys = ON');
}
