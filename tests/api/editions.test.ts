import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { block, doc, doubtful, paragraph, text } from '#shared/document/documents.fixture.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, startTestServer } from '../helpers/server.ts';

let server: TestServer;
let editor: Caller;
let second: Caller;
let reader: Caller;
let manualId: string;
let pages: string[];
let count = 0;

const at = (rest = ''): string => `/api/manuals/${manualId}/editions${rest}`;
const named = (id: string, words: string) => block('paragraph', { id }, text(words));
const write = (page: number, baseRevision: number, ...words: string[]) =>
  editor.put(`/api/pages/${pages[page]}/document`, {
    ...{ baseRevision, document: doc(...words.map((each, index) => named(`p${index}`, each))) },
  });
const publish = (number: number, more: object = {}) => second.post(at(), { number, ...more });
const channel = { symbol: 'channel', label: 'Channel', kind: 'input', unit: '', home: 12, printed: { text: '12' } };

beforeAll(async () => {
  server = await startTestServer();
  [editor, second, reader] = await Promise.all([server.as('editor'), server.as('archivist'), server.as('reader')]);
});
beforeEach(async () => {
  manualId = await second.newManual();
  for (const number of [1, 2]) {
    count += 1;
    await second.upload(manualId, [{ name: `sheet-${number}.jpg`, bytes: drawSheet(sheet(count)) }]);
  }
  pages = (await second.pagesOf(manualId)).map(({ id }) => id);
});
afterAll(() => server.stop());

describe('publishing an edition', () => {
  it('of a manual that nobody has read is refused in words', async () => {
    const reply = await publish(1);
    expect(reply.status).toBe(422);
    expect(reply.body.detail).toContain('No page of this manual has been read yet');
  });

  it('warns of what is not proofed, of doubts, of pages not read and of values that do not come out', async () => {
    await editor.put(`/api/pages/${pages[0]}/document`, {
      ...{ baseRevision: 0, document: doc(paragraph(doubtful('injeclion'))) },
    });
    await editor.post(`/api/manuals/${manualId}/quantities`, { ...channel, printed: { text: '13' } });
    const { body } = await second.get(`/api/manuals/${manualId}/edition-draft`);
    expect(body).toMatchObject({
      ...{ number: 1, pages: 1, isSame: false },
      unread: [{ pageId: pages[1] }],
      notProofed: [{ pageId: pages[0] }],
      doubts: [{ pageId: pages[0], doubtCount: 1 }],
      disagreeing: [{ symbol: 'channel', printed: '13' }],
    });
    const reply = await publish(1, { name: 'Trial issue', note: 'For the bench' });
    expect(reply).toMatchObject({
      status: 201,
      body: {
        ...{ number: 1, name: 'Trial issue', note: 'For the bench', publishedBy: 'Test archivist', isLatest: true },
        standing: { pages: 1, unread: 1, notProofed: 1, doubts: 1, disagreeing: 1 },
      },
    });
  });

  it('keeps pages and values as they were, whatever is written later', async () => {
    await write(0, 0, 'Tune L5');
    const made = await editor.post(`/api/manuals/${manualId}/quantities`, channel);
    await second.post(`/api/pages/${pages[0]}/proofed`, { revision: 1 });
    await publish(1);
    await write(0, 1, 'Tune L6');
    await editor.patch(`/api/manuals/${manualId}/quantities/${made.body.id}`, { home: 16 });
    const { body: page } = await reader.get(at(`/1/pages/${pages[0]}`));
    expect(page).toMatchObject({ revision: 1, state: 'proofed', signOff: { signedBy: 'Test archivist' } });
    expect(JSON.stringify(page.document)).toContain('Tune L5');
    expect((await reader.get(at('/1/quantities'))).body.quantities).toMatchObject([{ symbol: 'channel', home: 12 }]);
    expect(JSON.stringify((await reader.get(`/api/pages/${pages[0]}`)).body.document)).toContain('Tune L6');
    expect((await reader.get(at('/1'))).body.pages).toMatchObject([{ pageId: pages[0], signedBy: 'Test archivist' }]);
    expect((await reader.get(at(`/1/pages/${pages[1]}`))).status).toBe(404);
  });

  it('by two at once gives one edition and one refusal', async () => {
    await write(0, 0, 'Tune L5');
    await publish(1);
    const reply = await publish(1);
    expect(reply).toMatchObject({ status: 409, body: { current: 1 } });
    expect(reply.body.detail).toContain('Test archivist published edition 1 meanwhile');
  });

  it('says when nothing has changed since the one before', async () => {
    await write(0, 0, 'Tune L5');
    await publish(1);
    expect((await second.get(`/api/manuals/${manualId}/edition-draft`)).body).toMatchObject({
      number: 2,
      isSame: true,
    });
  });
});

describe('withdrawing an edition', () => {
  it('asks for a reason, keeps it in the list, and gives readers the one before', async () => {
    await write(0, 0, 'Tune L5');
    await publish(1);
    await publish(2);
    expect((await second.post(at('/2/withdraw'), { reason: ' ' })).status).toBe(400);
    const { body } = await second.post(at('/2/withdraw'), { reason: 'Wrong crystal table' });
    expect(body).toMatchObject({ isLatest: false, withdrawn: { by: 'Test archivist', reason: 'Wrong crystal table' } });
    const { items } = (await reader.get(at())).body;
    expect(items.map((each: any) => [each.number, each.isLatest, each.withdrawn !== null])).toEqual([
      [2, false, true],
      [1, true, false],
    ]);
    expect((await second.post(at('/2/withdraw'), { reason: 'Again' })).status).toBe(409);
    // Its number is not given to another.
    expect((await second.get(`/api/manuals/${manualId}/edition-draft`)).body.number).toBe(3);
  });
});

describe('the difference between two editions', () => {
  it('lists pages and quantities that were added, removed and changed', async () => {
    await write(0, 0, 'Tune L5', 'Lock it');
    const first = await editor.post(`/api/manuals/${manualId}/quantities`, channel);
    await editor.post(`/api/manuals/${manualId}/quantities`, { ...channel, symbol: 'gain' });
    await publish(1);
    await write(0, 1, 'Tune L6', 'Lock it');
    await write(1, 0, 'New page');
    await editor.patch(`/api/manuals/${manualId}/quantities/${first.body.id}`, { home: 16 });
    await editor.post(`/api/manuals/${manualId}/quantities`, { ...channel, symbol: 'offset' });
    await publish(2);
    const { body } = await reader.get(at('/1/difference?to=2'));
    expect(body).toMatchObject({
      ...{ from: 1, to: 2 },
      pages: {
        added: [{ pageId: pages[1] }],
        removed: [],
        changed: [{ pageId: pages[0], from: 1, to: 2, change: 'words' }],
        same: 0,
      },
      quantities: {
        added: [{ symbol: 'offset' }],
        removed: [],
        changed: [{ before: { home: 12 }, after: { home: 16 } }],
      },
    });
    const backwards = (await reader.get(at('/2/difference?to=1'))).body;
    expect(backwards.pages.removed).toMatchObject([{ pageId: pages[1] }]);
    const untilNow = (await reader.get(at('/2/difference'))).body;
    expect(untilNow).toMatchObject({ to: 'work', pages: { added: [], changed: [], same: 2 } });
  });
});

describe('a page that is in an edition', () => {
  it('cannot be divided or joined away', async () => {
    const archivist = second;
    await archivist.post(`/api/pages/${pages[0]}/division`);
    const halves = (await archivist.pagesOf(manualId)).slice(0, 2).map(({ id }) => id);
    await editor.put(`/api/pages/${halves[1]}/document`, { baseRevision: 0, document: doc(named('p0', 'Right')) });
    await publish(1);
    // As if nobody had worked on it: what the machine reads may be published too.
    const { db } = server.tools;
    const { pages: table } = await import('#server/db/schema/index.ts');
    db.update(table).set({ state: 'read' }).run();
    const reply = await archivist.delete(`/api/pages/${halves[0]}/division`);
    expect(reply.status).toBe(422);
    expect(reply.body.detail).toContain('is in edition 1 of this manual');
    expect((await archivist.get(at(`/1/pages/${halves[1]}`))).status).toBe(200);
  });
});

it('a reader cannot publish or withdraw', async () => {
  for (const address of ['', '/1/withdraw']) expect((await reader.post(at(address))).status).toBe(403);
});
