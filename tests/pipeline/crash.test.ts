import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { afterEach, describe, expect, it } from 'vitest';
import { openDatabase, projectRoot } from '#server/db/database.ts';
import { createAuth } from '#server/features/accounts/index.ts';
import { readOrCreateSecret } from '#server/config/secret.ts';
import { Caller, addressOf, eventually, password } from '../helpers/server.ts';
import { scanOf, sheet } from '../helpers/scans.ts';

let child: ChildProcess | null = null;
let dataDir = '';

/** Starts the server as a person would, as a process of its own, and waits until it says that it is ready. */
async function start(): Promise<string> {
  const env = {
    ...process.env,
    NODE_ENV: 'test',
    PORT: '0',
    DATA_DIR: dataDir,
    SEED: 'none',
    LOG_LEVEL: 'silent',
    RECOGNITION_WORKERS: '1',
  };
  child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    cwd: projectRoot,
    env,
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  let said = '';
  return new Promise((resolve, reject) => {
    child?.stdout?.on('data', (chunk: Buffer) => {
      said += chunk.toString();
      const url = /ready at (\S+)/.exec(said)?.[1];
      if (url !== undefined) resolve(url);
    });
    child?.on('exit', (code) => reject(new Error(`The server ended with ${code}: ${said}`)));
  });
}

async function addArchivist(): Promise<void> {
  const { db, close } = openDatabase(dataDir);
  const publicUrl = 'http://127.0.0.1';
  const secret = readOrCreateSecret(dataDir);
  const auth = createAuth({ db }, { secret, publicUrl, trustedOrigins: [], sendMail: () => Promise.resolve() });
  await auth.api.createUser({
    body: { email: addressOf('archivist'), name: 'Test archivist', password, role: 'archivist' },
  });
  close();
}

async function kill(signal: NodeJS.Signals): Promise<number | null> {
  const dying = child;
  const ended = new Promise<number | null>((resolve) => dying?.on('exit', (code) => resolve(code)));
  dying?.kill(signal);
  child = null;
  return ended;
}

afterEach(() => {
  child?.kill('SIGKILL');
  rmSync(dataDir, { recursive: true, force: true });
});

/** What must be as if nothing had happened. */
function stateOf(): { pages: unknown[]; revisions: unknown[]; readings: number; sources: unknown[]; jobs: number } {
  const db = new BetterSqlite3(path.join(dataDir, 'benchleaf.sqlite'), { readonly: true });
  const all = (sql: string): unknown[] => db.prepare(sql).all();
  const state = {
    pages: all(
      `select pages.position, pages.state, pages.revision, pages.problem from pages join manuals m on m.id = manual_id where m.title = 'Crash' order by position`,
    ),
    revisions: all(
      `select pages.position, number, origin from revisions join pages on pages.id = page_id join manuals m on m.id = manual_id where m.title = 'Crash' order by position, number`,
    ),
    readings: all(
      `select r.id from readings r join pages on pages.id = page_id join manuals m on m.id = manual_id where m.title = 'Crash'`,
    ).length,
    sources: all(
      `select file_name, page_count from sources join manuals m on m.id = manual_id where m.title = 'Crash'`,
    ),
    jobs: all(`select j.id from jobs j join manuals m on m.id = j.manual_id where m.title = 'Crash'`).length,
  };
  db.close();
  return state;
}

describe('a server that is killed while it reads', () => {
  it('goes on where it was: no page is lost and none is read into two documents', async () => {
    dataDir = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-crash-'));
    const pageCount = 6;
    await addArchivist();
    let url = await start();
    const signIn = () => Caller.signIn(url, addressOf('archivist'), password);
    let archivist = await signIn();
    const manualId = await archivist.newManual('Crash');
    await archivist.upload(manualId, [
      { name: 'six.pdf', bytes: await scanOf(Array.from({ length: pageCount }, (_, at) => sheet(at + 1))) },
    ]);

    const isDone = ({ state }: { state: string }): boolean => state === 'read';
    for (const doneBefore of [0, 2, 4]) {
      await eventually(
        () => archivist.pagesOf(manualId),
        (pages) => pages.filter(isDone).length >= doneBefore && pages.some(({ state }) => state === 'reading'),
      );
      await kill('SIGKILL');
      url = await start();
      archivist = await signIn();
    }
    await eventually(
      () => archivist.pagesOf(manualId),
      (pages) => pages.every(isDone),
    );
    await eventually(
      () => Promise.resolve(stateOf().jobs),
      (jobs) => jobs === 0,
    );
    expect(await kill('SIGTERM')).toBe(0);

    const positions = Array.from({ length: pageCount }, (_, at) => at + 1);
    expect(stateOf()).toEqual({
      pages: positions.map((position) => ({ position, state: 'read', revision: 1, problem: null })),
      revisions: positions.map((position) => ({ position, number: 1, origin: 'machine' })),
      readings: pageCount,
      sources: [{ file_name: 'six.pdf', page_count: pageCount }],
      jobs: 0,
    });
  });
});
