import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type TestServer, type Caller, eventually, startTestServer } from '../helpers/server.ts';
import { scanOf } from '../helpers/scans.ts';

let server: TestServer;
let archivist: Caller;
let editor: Caller;
let manualId: string;
beforeAll(async () => {
  server = await startTestServer({ workers: 1 });
  archivist = await server.as('archivist');
  editor = await server.as('editor');
  manualId = await archivist.newManual();
  const page = (n: number): string[] => ['TUNING', '', `Set the Kleenotron to mark ${n} of the dial by hand.`];
  await archivist.upload(manualId, [{ name: 'three.pdf', bytes: await scanOf([page(1), page(2), page(3)]) }]);
  await eventually(
    () => archivist.pagesOf(manualId),
    (pages) => pages.length === 3 && pages.every(({ state }) => state === 'read'),
  );
});
afterAll(() => server.stop());

const doubtsOf = async (pageId: string): Promise<unknown[]> => {
  const { body } = await editor.get(`/api/pages/${pageId}`);
  const found = [
    ...JSON.stringify(body.document).matchAll(/"reason":"(corrected-elsewhere)","proposals":(\[[^\]]*\])/g),
  ];
  return found.map(([, , proposals]) => JSON.parse(proposals ?? '[]'));
};

describe('a correction on one page', () => {
  it('is proposed on the pages that nobody has touched, until learning is switched off', async () => {
    const [first, second] = await archivist.pagesOf(manualId);
    const { body } = await editor.get(`/api/pages/${first.id}`);
    const document = JSON.parse(JSON.stringify(body.document).replace(/Kleenotron/, 'Klienotron'));
    await editor.put(`/api/pages/${first.id}/document`, { baseRevision: 1, document });
    await eventually(
      () => doubtsOf(second.id),
      (found) => found.length === 1,
      20_000,
    );
    expect(await doubtsOf(second.id)).toEqual([['Klienotron']]);
    const [, after] = await archivist.pagesOf(manualId);
    expect(after).toMatchObject({ revision: 1, doubtCount: second.doubtCount + 1 });

    expect((await archivist.patch(`/api/manuals/${manualId}`, { learns: false })).body.learns).toBe(false);
    await eventually(
      () => doubtsOf(second.id),
      (found) => found.length === 0,
      20_000,
    );
  });
});

describe('a double-page spread', () => {
  it('is divided into two pages that are read anew, and joined again', async () => {
    const [, , third] = await archivist.pagesOf(manualId);
    expect((await editor.post(`/api/pages/${third.id}/division`)).status).toBe(403);
    const divided = await archivist.post(`/api/pages/${third.id}/division`, { cutShare: 0.4 });
    expect(divided).toMatchObject({ status: 202, body: { items: [{ half: 'left' }, { half: 'right' }] } });
    const halves = await eventually(
      () => archivist.pagesOf(manualId),
      (pages) => pages.length === 4 && pages.every(({ state }) => state !== 'waiting' && state !== 'reading'),
    );
    expect(halves.map(({ label, position }) => [label, position])).toEqual([
      ['1', 1],
      ['2', 2],
      ['3 left', 3],
      ['3 right', 4],
    ]);
    const right = (await archivist.get(`/api/pages/${halves[3].id}`)).body;
    const left = (await archivist.get(`/api/pages/${third.id}`)).body;
    expect([left.width, right.width].map((width) => Math.round(width / 100))).toEqual([10, 15]);
    expect((await archivist.post(`/api/pages/${third.id}/division`)).status).toBe(422);

    expect((await archivist.delete(`/api/pages/${halves[3].id}/division`)).status).toBe(202);
    const joined = await eventually(
      () => archivist.pagesOf(manualId),
      (pages) => pages.length === 3 && pages.every(({ state }) => state !== 'waiting' && state !== 'reading'),
    );
    expect(joined[2]).toMatchObject({ id: third.id, label: '3', half: 'whole', position: 3 });
    expect((await archivist.get(`/api/pages/${third.id}/text`)).text).toContain('mark 3 of the dial');
  });

  it('stays as it is once somebody has worked on it', async () => {
    const [first] = await archivist.pagesOf(manualId);
    const reply = await archivist.post(`/api/pages/${first.id}/division`);
    expect(reply).toMatchObject({ status: 422, body: { detail: expect.stringContaining('worked on page 1') } });
  });
});

describe('a page that only the machine has read, in an edition', () => {
  it('gets a revision of its own when the manual teaches something; the edition stays as it was', async () => {
    const [, second] = await archivist.pagesOf(manualId);
    const edition = `/api/manuals/${manualId}/editions`;
    expect((await editor.post(edition, { number: 1 })).status).toBe(201);
    const before = (await editor.get(`${edition}/1/pages/${second.id}`)).body.document;
    await archivist.patch(`/api/manuals/${manualId}`, { learns: true });
    await eventually(
      () => doubtsOf(second.id),
      (found) => found.length === 1,
      20_000,
    );
    const { body } = await editor.get(`/api/pages/${second.id}`);
    expect(body).toMatchObject({ revision: 2, state: 'read' });
    expect((await editor.get(`${edition}/1/pages/${second.id}`)).body).toMatchObject({ revision: 1, document: before });
    const { body: refused } = await archivist.post(`/api/pages/${second.id}/division`);
    expect(refused.detail).toContain('is in edition 1 of this manual');
  });
});
