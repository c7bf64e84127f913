import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { block, doc, doubtful, paragraph, text } from '#shared/document/documents.fixture.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';
import { Writer } from '../helpers/writer.ts';

let server: TestServer;
let editor: Caller;
let second: Caller;
let pageId: string;
let count = 0;
const at = (rest = ''): string => `/api/pages/${pageId}${rest}`;
const page = async () => (await editor.get(at())).body;
const write = (who: Caller, baseRevision: number, words: string) =>
  who.put(at('/document'), { baseRevision, document: doc(paragraph(text(words))) });

beforeAll(async () => {
  server = await startTestServer();
  editor = await server.as('editor');
  second = await server.as('archivist');
});
beforeEach(async () => {
  const manualId = await second.newManual();
  count += 1;
  await second.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(count)) }]);
  pageId = (await second.pagesOf(manualId))[0].id;
});
afterAll(() => server.stop());

describe('signing a page off', () => {
  it('is done by an editor who did not write it, and says who and when', async () => {
    await write(editor, 0, 'Tune L5');
    const reply = await second.post(at('/proofed'), { revision: 1 });
    expect(reply).toMatchObject({
      status: 200,
      body: { state: 'proofed', signOff: { signedBy: 'Test archivist', doubtCount: 0 } },
    });
    expect(Date.parse(reply.body.signOff.signedAt)).toBeGreaterThan(Date.now() - 60_000);
    const { body } = await (await server.as('administrator')).get('/api/audit');
    expect(JSON.stringify(body.items[0])).toContain('signed a page off as proofed');
  });

  it('is refused in words to whoever wrote the newest text', async () => {
    await write(editor, 0, 'Tune L5');
    const reply = await editor.post(at('/proofed'), { revision: 1 });
    expect(reply.status).toBe(422);
    expect(reply.body.detail).toContain('Another editor has to sign it off');
    expect((await page()).state).toBe('corrected');
  });

  it('is refused to each of those who wrote it together', async () => {
    await write(editor, 0, 'Tune L5');
    const hands = [new Writer(editor, pageId), new Writer(second, pageId)];
    try {
      await eventually(
        () => Promise.resolve(hands.every(({ provider }) => provider.isSynced)),
        (isReady) => isReady,
        10_000,
      );
      hands.forEach((hand, index) => hand.add(`hand ${index}`));
      await eventually(
        () => Promise.resolve(hands.some(({ provider }) => provider.hasUnsyncedChanges)),
        (isWaiting) => !isWaiting,
        10_000,
      );
      expect((await (await server.as('administrator')).post(at('/proofed'), { revision: 1 })).status).toBe(409);
      const { body } = await editor.post(at('/revisions'));
      expect(body.author).toContain(', ');
      for (const who of [editor, second])
        expect((await who.post(at('/proofed'), { revision: body.number })).status).toBe(422);
      const third = await server.as('administrator');
      expect((await third.post(at('/proofed'), { revision: body.number })).status).toBe(200);
    } finally {
      for (const hand of hands) hand.close();
    }
  });

  it('of another revision than the newest is refused', async () => {
    await write(editor, 0, 'Tune L5');
    await write(editor, 1, 'Tune L6');
    expect(await second.post(at('/proofed'), { revision: 1 })).toMatchObject({ status: 409, body: { current: 2 } });
  });

  it('with doubts left asks for their number first', async () => {
    await editor.put(at('/document'), { baseRevision: 0, document: doc(paragraph(doubtful('injeclion'))) });
    const refused = await second.post(at('/proofed'), { revision: 1 });
    expect(refused).toMatchObject({ status: 422, body: { doubts: 1 } });
    expect(refused.body.detail).toContain('1 doubt left');
    const signed = await second.post(at('/proofed'), { revision: 1, doubts: 1 });
    expect(signed.body.signOff).toMatchObject({ doubtCount: 1 });
  });

  it('ends with the next revision, and can be taken back', async () => {
    await write(editor, 0, 'Tune L5');
    await second.post(at('/proofed'), { revision: 1 });
    await write(editor, 1, 'Tune L6');
    expect(await page()).toMatchObject({ state: 'corrected', signOff: null });
    await second.post(at('/proofed'), { revision: 2 });
    expect((await second.delete(at('/proofed'))).body).toMatchObject({ state: 'corrected', signOff: null });
    expect((await second.delete(at('/proofed'))).status).toBe(409);
  });

  it('of a page that nobody has read has nothing to sign', async () => {
    const reply = await second.post(at('/proofed'), { revision: 1 });
    expect(reply.status).toBe(422);
    expect(reply.body.detail).toContain('not read yet');
  });
});

describe('parts of older revisions', () => {
  const blocks = (...words: string[]) =>
    doc(...words.map((each, index) => block('paragraph', { id: `p${index}` }, text(each))));
  const save = (who: Caller, baseRevision: number, ...words: string[]) =>
    who.put(at('/document'), { baseRevision, document: blocks(...words) });

  it('are brought back into the text that people share, and the rest stays', async () => {
    await save(editor, 0, 'Tune L5', 'Lock it');
    await save(editor, 1, 'Tune L6', 'Lock it well');
    const hand = new Writer(second, pageId);
    try {
      await eventually(
        () => Promise.resolve(hand.words),
        (words) => words.includes('L6'),
        10_000,
      );
      const reply = await editor.post(at('/revisions/1/restore-part'), { baseRevision: 2, block: 'p0' });
      expect(reply.body).toMatchObject({ number: 3, note: 'One block as in revision 1' });
      expect((await editor.get(at('/text'))).text).toBe('Tune L5\nLock it well');
      await eventually(
        () => Promise.resolve(hand.words),
        (words) => words.includes('Tune L5') && words.includes('Lock it well'),
        10_000,
      );
    } finally {
      hand.close();
    }
    const late = await editor.post(at('/revisions/1/restore-part'), { baseRevision: 2, block: 'p1' });
    expect(late.status).toBe(409);
    const none = await editor.post(at('/revisions/1/restore-part'), { baseRevision: 3, block: 'x' });
    expect(none.status).toBe(422);
  });

  it('each have the one who wrote them', async () => {
    await save(editor, 0, 'Tune L5', 'Lock it');
    await save(second, 1, 'Tune L5', 'Lock it well');
    const { items } = (await editor.get(at('/authors'))).body;
    expect(items.map((each: any) => [each.block, each.revision.author])).toEqual([
      ['p0', 'Test editor'],
      ['p1', 'Test archivist'],
    ]);
  });
});
