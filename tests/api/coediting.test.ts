import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import WebSocket from 'ws';
import { coeditingPath } from '#shared/api/presence.ts';
import { block, doc, text } from '#shared/document/documents.fixture.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';
import { Writer } from '../helpers/writer.ts';

const quietSeconds = 1;
let server: TestServer;
let editor: Caller;
let archivist: Caller;
let manualId: string;
let pageId: string;
let writers: Writer[] = [];
const at = (rest = ''): string => `/api/pages/${pageId}${rest}`;
const textNow = async (): Promise<string> => (await editor.get(at('/text'))).text;
const revisionNow = async (): Promise<number> => (await editor.get(at())).body.revision as number;
const line = (id: string, words: string) => block('paragraph', { id }, text(words));

async function write(caller: Caller, to = pageId): Promise<Writer> {
  const writer = new Writer(caller, to);
  writers.push(writer);
  await eventually(
    () => Promise.resolve(writer.provider.isSynced || writer.refusals.length > 0),
    (isThere) => isThere,
    10_000,
  );
  return writer;
}
const arrived = (writer: Writer) =>
  eventually(
    () => Promise.resolve(writer.provider.hasUnsyncedChanges),
    (isWaiting) => !isWaiting,
    10_000,
  );
const shows = (writer: Writer, words: string) =>
  eventually(
    () => Promise.resolve(writer.words),
    (seen) => seen === words,
    10_000,
  );

beforeAll(async () => {
  server = await startTestServer({ env: { REVISION_AFTER_QUIET_SECONDS: String(quietSeconds) } });
  editor = await server.as('editor');
  archivist = await server.as('archivist');
});
beforeEach(async () => {
  manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(Math.floor(Math.random() * 1e9))) }]);
  pageId = (await archivist.pagesOf(manualId))[0].id;
  await editor.put(at('/document'), {
    baseRevision: 0,
    document: doc(line('a', 'Set the dial.'), line('b', 'Tune L5.')),
  });
});
afterEach(() => {
  for (const writer of writers) writer.close();
  writers = [];
});
afterAll(() => server.stop());

describe('two people on one page', () => {
  it('see what the other writes, and both are named in the revision that comes of it', async () => {
    const [one, two] = [await write(editor), await write(archivist)];
    one.add('From the editor.');
    two.add('From the archivist.');
    await Promise.all([arrived(one), arrived(two)]);
    await eventually(
      () => Promise.resolve([one.words, two.words]),
      ([a, b]) => a === b && a!.includes('editor') && a!.includes('archivist'),
      10_000,
    );
    const { body } = await editor.post(at('/revisions'), { note: 'Both of us' });
    expect(body).toMatchObject({ number: 2, origin: 'person', note: 'Both of us' });
    expect(String(body.author).split(', ').sort()).toEqual(['Test archivist', 'Test editor']);
    expect(await textNow()).toBe(one.words);
  });

  it('have it kept as a revision by itself once the page falls quiet', async () => {
    const one = await write(editor);
    one.add('Lock the core.');
    await eventually(revisionNow, (revision) => revision === 2, 10_000);
    expect(await textNow()).toBe('Set the dial.\nTune L5.\nLock the core.');
  });

  it('have it kept as a revision when the last of them leaves', async () => {
    const one = await write(editor);
    one.add('Seal it.');
    await arrived(one);
    one.close();
    await eventually(revisionNow, (revision) => revision === 2, 900);
  });

  it('make no revision of what was taken back', async () => {
    const one = await write(editor);
    one.add('A slip.');
    one.fragment.delete(2, 1);
    await arrived(one);
    expect((await editor.post(at('/revisions'))).body.number).toBe(1);
  });
});

describe('a page saved another way while people write on it', () => {
  it('reaches them as an edit, and nothing of theirs is lost', async () => {
    const one = await write(archivist);
    one.add('Seal it.');
    await arrived(one);
    const document = doc(line('a', 'Set the main dial.'), line('b', 'Tune L5.'));
    const reply = await editor.put(at('/document'), { baseRevision: 1, document });
    expect(reply).toMatchObject({ status: 200, body: { number: 3, author: 'Test editor' } });
    await shows(one, 'Set the main dial.\nTune L5.\nSeal it.');
    expect(await textNow()).toBe('Set the main dial.\nTune L5.\nSeal it.');
    expect((await editor.get(at('/revisions/2'))).body).toMatchObject({ author: 'Test archivist' });
  });

  it('reaches them when an older revision is restored, whose text they had gone on from', async () => {
    const one = await write(editor);
    one.add('Seal it.');
    await arrived(one);
    await editor.post(at('/revisions/1/restore'));
    await shows(one, 'Set the dial.\nTune L5.');
    expect(JSON.stringify((await editor.get(at('/revisions/2'))).body.document)).toContain('Seal it.');
  });
});

describe('who may not write', () => {
  it.each(['reader', 'technician'] as const)('a %s writes nothing, whatever is sent', async (role) => {
    const reader = await write(await server.as(role));
    expect(reader.words).toBe('Set the dial.\nTune L5.');
    reader.add('Not from here.');
    reader.fragment.delete(0, 1);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(reader.provider.hasUnsyncedChanges).toBe(true);
    const one = await write(editor);
    expect(one.words).toBe('Set the dial.\nTune L5.');
    await editor.post(at('/revisions'));
    expect(await revisionNow()).toBe(1);
  });

  it('an editor whose role is lowered writes nothing from then on', async () => {
    const administrator = await server.as('administrator');
    const { body } = await administrator.get('/api/people');
    const { id } = body.items.find(({ name }: { name: string }) => name === 'Test editor');
    const one = await write(editor);
    one.add('While I may.');
    await arrived(one);
    await administrator.patch(`/api/people/${id}`, { role: 'reader' });
    one.add('No more.');
    await new Promise((resolve) => setTimeout(resolve, 300));
    await administrator.patch(`/api/people/${id}`, { role: 'editor' });
    const two = await write(archivist);
    expect(two.words).toBe('Set the dial.\nTune L5.\nWhile I may.');
  });

  it('a stranger, or a page of another site, is not even connected', async () => {
    const outcome = (headers: Record<string, string>) =>
      new Promise<string>((resolve) => {
        const socket = new WebSocket(`${server.url.replace('http', 'ws')}${coeditingPath}`, { headers });
        socket.on('open', () => resolve('open'));
        socket.on('error', ({ message }) => resolve(message));
      });
    expect(await outcome({ origin: server.url })).toContain('401');
    expect(await outcome({ origin: 'https://elsewhere.example', cookie: editor.cookie })).toContain('403');
  });

  it('a page that is not there, or has no text yet, is refused in words', async () => {
    await archivist.upload(manualId, [
      { name: 'second.jpg', bytes: drawSheet(sheet(Math.floor(Math.random() * 1e9))) },
    ]);
    const unread = (await archivist.pagesOf(manualId))[1].id as string;
    expect((await write(editor, 'no-such-page')).refusals).toEqual(['There is no such page.']);
    expect((await write(editor, unread)).refusals.join()).toMatch(/not read/);
  });
});

describe('a manual that is put in the bin while its page is open', () => {
  it('has what they wrote when it is taken back out', async () => {
    const one = await write(editor);
    one.add('Before the bin.');
    await arrived(one);
    await archivist.delete(`/api/manuals/${manualId}`);
    const { status } = await archivist.post(`/api/manuals/${manualId}/restore`);
    expect(status).toBe(200);
    await editor.post(at('/revisions'));
    expect(await textNow()).toBe('Set the dial.\nTune L5.\nBefore the bin.');
  });
});

describe('presence', () => {
  it('names who has which page open to correct it, and forgets them when they leave', async () => {
    const one = await write(editor);
    await write(await server.as('reader'));
    const present = async () => (await editor.get(`/api/manuals/${manualId}/presence`)).body.items;
    expect(await present()).toMatchObject([{ pageId, people: [{ name: 'Test editor' }] }]);
    one.close();
    await eventually(present, (items) => items.length === 0, 5_000);
  });
});
