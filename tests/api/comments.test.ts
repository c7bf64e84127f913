import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { block, doc, word } from '#shared/document/documents.fixture.ts';
import type { LiveEvent } from '#shared/api/events.ts';
import type { Transform } from '#shared/reading/reading.ts';
import { readings } from '#server/db/schema/index.ts';
import { structureStep } from '#server/features/revisions/index.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type Reply, type TestServer, startTestServer } from '../helpers/server.ts';

let server: TestServer;
let [reader, technician, editor, archivist, administrator]: Caller[] = [];
let manualId: string;
let pageId: string;
let names: Map<string, string>;

const anchor = { block: 'a', quote: '145.900 mc', at: 21, zone: [300, 200, 120, 20] };
const ask = (by: Caller | undefined, words = 'Is this not 145.090?', more: object = {}): Promise<Reply> =>
  by!.post(`/api/pages/${pageId}/comments`, { kind: 'question', words, anchor, ...more });
const reply = (by: Caller | undefined, id: string, words: string, mentions: string[] = []): Promise<Reply> =>
  by!.post(`/api/comments/${id}/replies`, { words, mentions });
const resolve = (by: Caller | undefined, id: string, resolved = true): Promise<Reply> =>
  by!.put(`/api/comments/${id}/resolution`, { resolved });
const onPage = async (): Promise<any[]> => (await reader!.get(`/api/pages/${pageId}/comments`)).body.items;
const idOf = (name: string): string => names.get(name) ?? '';
const mails = async (): Promise<any[]> => (await administrator!.get('/api/outbox?limit=50')).body.items;

beforeAll(async () => {
  server = await startTestServer();
  [reader, technician, editor, archivist, administrator] = await Promise.all(
    (['reader', 'technician', 'editor', 'archivist', 'administrator'] as const).map((role) => server.as(role)),
  );
  const { body } = await technician!.get('/api/people/names');
  names = new Map(body.items.map(({ id, name }: { id: string; name: string }) => [name, id]));
});
beforeEach(async () => {
  manualId = await archivist!.newManual();
  await archivist!.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(Math.floor(Math.random() * 1e9))) }]);
  pageId = (await archivist!.pagesOf(manualId))[0].id;
  const document = doc(block('step', { id: 'a', marker: 'c.' }, word('145.900', [300, 200, 90, 20])));
  await editor!.put(`/api/pages/${pageId}/document`, { baseRevision: 0, document });
});
afterAll(() => server.stop());

describe('a thread', () => {
  it('begins with words on a place of the page, and takes replies', async () => {
    const made = await ask(technician);
    expect(made).toMatchObject({
      status: 201,
      body: { kind: 'question', author: 'Test technician', anchor, replies: [] },
    });
    const answered = await reply(editor, made.body.id, 'No: the crystal says so.');
    expect(answered).toMatchObject({ status: 201, body: { id: made.body.id, replies: [{ author: 'Test editor' }] } });
    expect(await onPage()).toEqual([answered.body]);
  });

  it('may stand at a place of the scan alone, but not nowhere', async () => {
    const place = { block: null, quote: '', zone: [10, 10, 40, 40] };
    expect((await ask(technician, 'A stain?', { anchor: place })).status).toBe(201);
    expect((await ask(technician, 'Where?', { anchor: { ...place, zone: null } })).status).toBe(400);
    expect((await ask(technician, '  ')).status).toBe(400);
  });

  it('has one level of replies', async () => {
    const { body } = await ask(technician);
    const { body: thread } = await reply(editor, body.id, 'No.');
    expect((await reply(technician, thread.replies[0].id, 'Sure?')).status).toBe(422);
  });

  it('is not found once its manual lies in the bin', async () => {
    const { body } = await ask(technician);
    await archivist!.delete(`/api/manuals/${manualId}`);
    expect((await reply(technician, body.id, 'Hello?')).status).toBe(404);
  });
});

describe('who may', () => {
  it('read: everybody; ask and reply: a technician and above', async () => {
    const { body } = await ask(technician);
    expect((await onPage()).length).toBe(1);
    expect([(await ask(reader)).status, (await reply(reader, body.id, 'Me too.')).status]).toEqual([403, 403]);
    expect((await reader!.get('/api/people/names')).status).toBe(403);
  });

  it('resolve and reopen: editors and the author', async () => {
    const ofEditor = (await ask(editor)).body.id as string;
    expect((await resolve(technician, ofEditor)).status).toBe(403);
    const own = (await ask(technician)).body.id as string;
    expect((await resolve(technician, own)).body.resolved).toMatchObject({ by: 'Test technician' });
    expect((await resolve(editor, own, false)).body.resolved).toBeNull();
  });

  it('change and delete: the author alone', async () => {
    const { id } = (await ask(technician)).body;
    expect((await editor!.patch(`/api/comments/${id}`, { words: 'Mine now' })).status).toBe(403);
    expect((await administrator!.delete(`/api/comments/${id}`)).status).toBe(403);
    const changed = await technician!.patch(`/api/comments/${id}`, { words: 'Is it 145.9?', kind: 'note' });
    expect(changed.body).toMatchObject({ words: 'Is it 145.9?', kind: 'note', editedAt: expect.any(String) });
  });

  it('see names for mentioning, and nothing else of a person', async () => {
    const { body } = await technician!.get('/api/people/names');
    expect(body.items).toContainEqual({ id: expect.any(String), name: 'Test editor' });
  });
});

describe('deleting', () => {
  it('takes a comment away that nobody has answered', async () => {
    const { id } = (await ask(technician)).body;
    expect((await technician!.delete(`/api/comments/${id}`)).status).toBe(200);
    expect(await onPage()).toEqual([]);
  });

  it('keeps the place of the replies, until the last of them goes', async () => {
    const { id } = (await ask(technician)).body;
    const thread = (await reply(editor, id, 'No.')).body;
    await technician!.delete(`/api/comments/${id}`);
    expect(await onPage()).toMatchObject([{ id, words: '', isDeleted: true, anchor, replies: [{ words: 'No.' }] }]);
    expect((await technician!.patch(`/api/comments/${id}`, { words: 'Back' })).status).toBe(409);
    await editor!.delete(`/api/comments/${thread.replies[0].id}`);
    expect(await onPage()).toEqual([]);
  });

  it('goes with a page that is removed', async () => {
    const [left, right] = (await archivist!.pagesOf(manualId)).length === 1 ? await divided() : [];
    pageId = right.id;
    const { id } = (await ask(technician)).body;
    await reply(editor, id, 'No.');
    expect((await archivist!.delete(`/api/pages/${left.id}/division`)).status).toBe(202);
    expect((await technician!.get(`/api/manuals/${manualId}/comments`)).body.items).toEqual([]);
  });
});

/** A fresh page that nobody has worked on, as two halves. */
async function divided(): Promise<any[]> {
  await archivist!.upload(manualId, [{ name: 'wide.jpg', bytes: drawSheet(sheet(Math.floor(Math.random() * 1e9))) }]);
  const page = (await archivist!.pagesOf(manualId))[1];
  return (await archivist!.post(`/api/pages/${page.id}/division`)).body.items;
}

describe('letters', () => {
  it('go to those who are mentioned, with the words, the page and a link', async () => {
    const words = 'What do you read here, @Test technician?';
    const made = await ask(editor, words, { mentions: [idOf('Test technician'), idOf('Test reader'), 'nobody'] });
    expect(made.body.mentions).toEqual([{ id: idOf('Test technician'), name: 'Test technician' }]);
    const [mail, ...others] = (await mails()).filter(({ text }) => text.includes(made.body.id));
    expect(others).toEqual([]);
    expect(mail.to).toBe('technician@test.example');
    expect(mail.subject).toContain('Test editor mentioned you on page 1');
    expect(mail.text).toContain(words);
    expect(mail.text).toContain(`${server.url}/pages/${pageId}/read?comment=${made.body.id}`);
  });

  it('go to the author of a thread when another replies, and never to oneself', async () => {
    const { id } = (await ask(editor)).body;
    await reply(editor, id, 'I mean the third figure. @Test editor', [idOf('Test editor')]);
    await reply(technician, id, 'I read 145.900.');
    const sent = (await mails()).filter(({ text }) => text.includes(id));
    expect(sent.map(({ to }) => to)).toEqual(['editor@test.example']);
    expect(sent[0].subject).toContain('Test technician replied to you');
  });

  it('go once: a change of the words tells only those who are new in them', async () => {
    const who = [idOf('Test technician'), idOf('Test archivist')];
    const { id } = (await ask(editor, 'See @Test technician', { mentions: who })).body;
    await editor!.patch(`/api/comments/${id}`, { words: 'See @Test technician or @Test archivist', mentions: who });
    const sent = (await mails()).filter(({ text }) => text.includes(id));
    expect(sent.map(({ to }) => to).sort()).toEqual(['archivist@test.example', 'technician@test.example']);
  });
});

describe('the list of a manual', () => {
  it('gives what is still open, with the label of its page', async () => {
    const [first, second] = [(await ask(technician, 'First?')).body.id, (await ask(technician, 'Second?')).body.id];
    await resolve(editor, first);
    const list = async (query: string) => (await reader!.get(`/api/manuals/${manualId}/comments${query}`)).body.items;
    expect(await list('?open=true')).toMatchObject([{ id: second, pageId, pageLabel: '1' }]);
    expect(await list('')).toHaveLength(2);
  });
});

describe('what is told', () => {
  it('a live event follows every change', async () => {
    const seen: LiveEvent[] = [];
    const end = server.tools.live.subscribe((event) => seen.push(event));
    const { id } = (await ask(technician)).body;
    await reply(editor, id, 'No.');
    await resolve(editor, id);
    await technician!.delete(`/api/comments/${id}`);
    end();
    const told = seen.filter(({ type }) => type === 'comments');
    expect(told).toEqual(Array.from({ length: 4 }, () => ({ type: 'comments', manualId, pageId })));
  });

  it('the audit trail names every deed', async () => {
    const { id } = (await ask(technician)).body;
    await reply(editor, id, 'No.');
    await technician!.patch(`/api/comments/${id}`, { words: 'Is it?' });
    await resolve(editor, id);
    await resolve(editor, id, false);
    await technician!.delete(`/api/comments/${id}`);
    const { body } = await administrator!.get('/api/audit?limit=20');
    const deeds = body.items.filter(({ details }: any) => details?.commentId === id).map(({ did }: any) => did);
    expect(deeds.reverse()).toEqual([
      'asked a question',
      'replied to a comment',
      'changed a comment',
      'resolved a comment',
      'reopened a comment',
      'deleted a comment',
    ]);
  });
});

describe('a page that is read again', () => {
  const readAs = (left: number): number => {
    const recipe = { engine: 'e', language: 'eng', segmentation: 'columns', dpi: 150, skewDegrees: 0 } as const;
    const content = {
      recipe: { ...recipe, rulesRemoved: false, flattened: false },
      ...{ confidence: 90, width: 1000, height: 1400, words: [], figures: [] },
      transform: [
        [1, 0, left],
        [0, 1, 0],
      ] as Transform,
    };
    const row = { pageId, imageKey: 'none', content, createdAt: new Date() };
    return server.tools.db.insert(readings).values(row).returning().get().id;
  };
  const structure = (readingId: number): unknown =>
    structureStep(server.tools).run({ subjectId: pageId, wish: { readingId } } as never);

  it('keeps the comments at the same print, which lies elsewhere in the new picture', async () => {
    structure(readAs(0));
    await ask(technician, 'A stain?', { anchor: { block: null, quote: '', zone: [100, 200, 40, 20] } });
    structure(readAs(30));
    expect(await onPage()).toMatchObject([{ anchor: { zone: [70, 200, 40, 20] } }]);
  });
});
