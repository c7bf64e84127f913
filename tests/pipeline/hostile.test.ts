import { readFileSync, readdirSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type HostileFile, hostileFiles } from '../helpers/hostile.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';

const mostBytes = 1.5 * 1024 ** 3;
let server: TestServer;
let archivist: Caller;
let files: HostileFile[];
beforeAll(async () => {
  files = await hostileFiles();
  server = await startTestServer({ workers: 1, env: { PAGE_TIMEOUT_SECONDS: '60' } });
  archivist = await server.as('archivist');
});
afterAll(() => server.stop());

/** Resident memory of this process (the server runs in it) and of the worker processes under it, by the kernel's account. */
function residentBytes(): number {
  const parentOf = new Map<number, number>();
  for (const name of readdirSync('/proc')) {
    if (!/^\d+$/.test(name)) continue;
    try {
      const stat = readFileSync(`/proc/${name}/stat`, 'utf8');
      parentOf.set(Number(name), Number(stat.slice(stat.lastIndexOf(')') + 2).split(' ')[1]));
    } catch {
      // It ended while we looked.
    }
  }
  const isOurs = (pid: number): boolean => pid === process.pid || (parentOf.has(pid) && isOurs(parentOf.get(pid) ?? 0));
  const bytesOf = (pid: number): number => {
    try {
      return Number(readFileSync(`/proc/${pid}/statm`, 'utf8').split(' ')[1]) * 4096;
    } catch {
      return 0;
    }
  };
  return [...parentOf.keys()].filter(isOurs).reduce((sum, pid) => sum + bytesOf(pid), 0);
}

describe('twenty hostile files', () => {
  it('are each answered for; none takes the server down or its memory up', async () => {
    let highest = 0;
    const watch = setInterval(() => (highest = Math.max(highest, residentBytes())), 200);
    const unanswered: string[] = [];
    for (const { name, bytes } of files) {
      const manualId = await archivist.newManual(name);
      const reply = await archivist.upload(manualId, [{ name, bytes }]);
      if (reply.status >= 400 && reply.status < 500) {
        expect([name, reply.body.detail.length > 20]).toEqual([name, true]);
        continue;
      }
      expect([name, reply.status]).toEqual([name, 202]);
      const [page] = await eventually(
        () => archivist.pagesOf(manualId),
        ([first]) => first?.state === 'failed' || first?.state === 'read',
        200_000,
      );
      if (page.state !== 'failed' || page.problem.length < 20) unanswered.push(name);
    }
    clearInterval(watch);
    expect(unanswered).toEqual([]);
    expect(files).toHaveLength(20);
    expect(highest).toBeLessThan(mostBytes);
  });

  it('leave the server as able as before', async () => {
    const manualId = await archivist.newManual('After the storm');
    await archivist.upload(manualId, [{ name: 'fine.jpg', bytes: drawSheet(sheet(5)) }]);
    await eventually(
      () => archivist.pagesOf(manualId),
      ([page]) => page?.state === 'read',
    );
    expect((await archivist.get('/api/health')).body).toMatchObject({ status: 'ok' });
  });
});
