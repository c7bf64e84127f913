import path from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { scanOf, sheet } from '../helpers/scans.ts';
import { ServerProcess } from '../helpers/server-process.ts';
import { Caller, addressOf, eventually, password } from '../helpers/server.ts';

let server: ServerProcess;
beforeEach(() => {
  server = new ServerProcess('crash', { RECOGNITION_WORKERS: '1' });
});
afterEach(() => server.remove());

/** What must be as if nothing had happened. */
function stateOf(): { pages: unknown[]; revisions: unknown[]; readings: number; sources: unknown[]; jobs: number } {
  const db = new BetterSqlite3(path.join(server.dataDir, 'benchleaf.sqlite'), { readonly: true });
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
    const pageCount = 6;
    await server.addPerson('archivist');
    let url = await server.start();
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
      await server.kill('SIGKILL');
      url = await server.start();
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
    expect(await server.kill('SIGTERM')).toBe(0);

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
