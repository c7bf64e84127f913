import { copyFileSync, mkdirSync, mkdtempSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { drizzle } from 'drizzle-orm/better-sqlite3';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import { describe, expect, it } from 'vitest';
import { openDatabase, projectRoot } from '#server/db/database.ts';

type Journal = { entries: { idx: number; tag: string }[] };
const drizzleDir = path.join(projectRoot, 'drizzle');
const journal = JSON.parse(readFileSync(path.join(drizzleDir, 'meta/_journal.json'), 'utf8')) as Journal;

/** A data folder whose database stands where it stood after the first migrations, filled. */
function oldDatabase(migrations: number): string {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-old-'));
  const partial = path.join(folder, 'migrations');
  mkdirSync(path.join(partial, 'meta'), { recursive: true });
  const entries = journal.entries.slice(0, migrations);
  writeFileSync(path.join(partial, 'meta/_journal.json'), JSON.stringify({ ...journal, entries }));
  for (const { tag } of entries) copyFileSync(path.join(drizzleDir, `${tag}.sql`), path.join(partial, `${tag}.sql`));
  const raw = new BetterSqlite3(path.join(folder, 'benchleaf.sqlite'));
  migrate(drizzle(raw), { migrationsFolder: partial });
  raw.exec(`
    insert into manuals (id, title, created_at, created_by) values ('m', 'HB-12', 1, 'a');
    insert into sources (id, manual_id, file_name, sha256, bytes, media_type, state, created_at, created_by) values ('s', 'm', 'f', 'x', 1, 'image/png', 'ready', 1, 'a');
    insert into pages (id, manual_id, source_id, source_page, position, label, state) values ('p', 'm', 's', 0, 1, '1', 'read');
    insert into revisions (page_id, number, origin, author, note, doubt_count, document, saved_at) values ('p', 1, 'machine', 'r', '', 0, '{"type":"doc"}', 1);
    insert into revisions (page_id, number, origin, author, author_id, note, doubt_count, document, saved_at) values ('p', 2, 'person', 'Ed', 'u1', '', 0, '{"type":"doc"}', 1);
  `);
  raw.close();
  return folder;
}

describe('a database of an older version', () => {
  it('moves up from the first migration and loses nothing', () => {
    const { raw, close } = openDatabase(oldDatabase(1));
    const count = (table: string): number =>
      (raw.prepare(`select count(*) as n from ${table}`).get() as { n: number }).n;
    expect(['manuals', 'sources', 'pages', 'revisions'].map(count)).toEqual([1, 1, 1, 2]);
    expect(raw.pragma('foreign_keys', { simple: true })).toBe(1);
    raw.exec(
      `insert into search_entries (kind, page_id, manual_id, body, placed) values ('text', 'p', 'm', 'oscillator', '[]')`,
    );
    expect(raw.prepare(`select count(*) as n from search_words where search_words match 'oscillator'`).get()).toEqual({
      n: 1,
    });
    raw.exec(`delete from search_entries`);
    expect(raw.prepare(`select count(*) as n from search_words where search_words match 'oscillator'`).get()).toEqual({
      n: 0,
    });
    close();
  });

  it('keeps the name of who wrote a revision as the one of its authors', () => {
    const { raw, close } = openDatabase(oldDatabase(1));
    expect(raw.prepare('select author_ids as ids from revisions order by number').all()).toEqual([
      { ids: '[]' },
      { ids: '["u1"]' },
    ]);
    close();
  });

  it('is left alone by a second start', () => {
    const folder = oldDatabase(journal.entries.length);
    openDatabase(folder).close();
    const { raw, close } = openDatabase(folder);
    expect(raw.pragma('integrity_check', { simple: true })).toBe('ok');
    close();
  });
});

describe('the migrations', () => {
  it('are all listed in the journal, in order', () => {
    const files = readdirSync(drizzleDir)
      .filter((name) => name.endsWith('.sql'))
      .sort();
    expect(journal.entries.map(({ tag }) => `${tag}.sql`)).toEqual(files);
  });
});
