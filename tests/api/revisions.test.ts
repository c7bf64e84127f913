import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';
import { doc, doubtful, everyKind, paragraph, partsTable, text, word } from '#shared/document/documents.fixture.ts';
import { drawSheet, sheet } from '../helpers/scans.ts';

let server: TestServer;
let editor: Caller;
let manualId: string;
let pageId: string;
const at = (rest = ''): string => `/api/pages/${pageId}${rest}`;
const save = (baseRevision: number, document: object, note?: string) =>
  editor.put(at('/document'), { baseRevision, document, ...(note === undefined ? {} : { note }) });

beforeAll(async () => {
  server = await startTestServer();
  editor = await server.as('editor');
});
beforeEach(async () => {
  const archivist = await server.as('archivist');
  manualId = await archivist.newManual();
  await archivist.upload(manualId, [{ name: 'sheet.jpg', bytes: drawSheet(sheet(Math.floor(Math.random() * 1e9))) }]);
  pageId = (await archivist.pagesOf(manualId))[0].id;
});
afterAll(() => server.stop());

describe('saving a page', () => {
  it('makes the next revision and says whose it is', async () => {
    const reply = await save(0, doc(paragraph(word('Tune'), text(' L5'))), 'First words');
    expect(reply).toMatchObject({
      status: 200,
      body: { number: 1, origin: 'person', author: 'Test editor', note: 'First words' },
    });
    expect((await editor.get(at())).body).toMatchObject({ revision: 1, state: 'corrected', doubtCount: 0 });
    expect((await editor.get(at('/text'))).text).toBe('Tune L5');
  });

  it('on an older revision is refused with the current one, and changes nothing', async () => {
    await save(0, doc(paragraph(text('theirs'))));
    const reply = await save(0, doc(paragraph(text('mine'))));
    expect(reply).toMatchObject({ status: 409, body: { code: 'revision-conflict', current: { number: 1 } } });
    expect(JSON.stringify(reply.body.current.document)).toContain('theirs');
    expect((await editor.get(at('/text'))).text).toBe('theirs');
  });

  it('keeps every kind of block as it was sent', async () => {
    const sent = everyKind();
    const { body } = await save(0, sent);
    const { body: back } = await editor.get(at());
    expect(back.document).toEqual(body.document);
    expect(back.document.content.map(({ type }: { type: string }) => type)).toEqual(
      sent.content?.map(({ type }) => type),
    );
    expect(back.zones).toContainEqual({ block: 'b1', kind: 'heading', box: [1, 2, 300, 40] });
  });

  it('counts neighbouring words under one doubt once', async () => {
    await save(0, doc(paragraph(doubtful('one'), doubtful(' two'), text(' sure '), doubtful('three'))));
    expect((await editor.get(at())).body.doubtCount).toBe(2);
  });

  it.each([
    ['a kind that is not known', doc({ type: 'script', attrs: {} }), 'content.0'],
    ['a kind in the wrong place', doc(paragraph(paragraph())), 'content.0.content.0'],
    [
      'an attribute out of range',
      doc({ type: 'heading', attrs: { level: 9 }, content: [text('x')] }),
      'content.0.attrs.level',
    ],
    ['no blocks at all', { type: 'doc', content: [] }, ''],
    ['a later version', { type: 'doc', attrs: { version: 99 }, content: [paragraph()] }, 'attrs.version'],
    ['a mark that is not known', doc(paragraph(text('x', 'blink'))), 'content.0.content.0.marks'],
  ])('is refused with %s, and the place is named', async (_what, document, path) => {
    const reply = await save(0, document);
    expect(reply).toMatchObject({ status: 400, body: { code: 'invalid-input' } });
    expect(reply.body.issues.map((issue: { path: string }) => issue.path)).toContain(path);
  });

  it('of a document nested without end is refused and harms nothing', async () => {
    const levels = 5000;
    const deep = '{"type":"admonition","content":['.repeat(levels) + ']}'.repeat(levels);
    const reply = await fetch(server.url + at('/document'), {
      method: 'PUT',
      headers: { cookie: editor.cookie, 'content-type': 'application/json' },
      body: `{"baseRevision":0,"document":{"type":"doc","content":[${deep}]}}`,
    });
    expect(reply.status).toBe(400);
  });
});

describe('revisions', () => {
  it('are listed newest first, looked at and restored; a restore takes nothing away', async () => {
    await save(0, doc(paragraph(text('first'))));
    await save(1, doc(paragraph(text('second'))));
    expect((await editor.get(at('/revisions'))).body.items.map(({ number }: { number: number }) => number)).toEqual([
      2, 1,
    ]);
    expect((await editor.get(at('/revisions/1'))).body.document.content[0].content[0].text).toBe('first');
    const restored = await editor.post(at('/revisions/1/restore'));
    expect(restored.body).toMatchObject({ number: 3, note: 'As revision 1 was' });
    expect((await editor.get(at('/text'))).text).toBe('first');
    expect((await editor.get(at('/revisions'))).body.items).toHaveLength(3);
    expect((await editor.get(at('/revisions/9'))).status).toBe(404);
  });
});

describe('a parts list', () => {
  it('is given as cells, as rows of parts with values, and as CSV', async () => {
    await save(0, doc(partsTable()));
    const { body } = await editor.get(at('/tables'));
    expect(body.items).toMatchObject([
      {
        id: 't1',
        kind: 'parts',
        rows: [
          ['C1', 'Mica, 47 µµf ±5%', '22-1470', '1'],
          ['C2,C3', 'Paper, .01 mfd', '24-4103', '2'],
        ],
      },
    ]);
    const parts = await editor.get(`/api/manuals/${manualId}/parts`);
    expect(parts.body.items).toMatchObject([
      {
        refDes: 'C1',
        partNumber: '22-1470',
        quantity: '1',
        value: { magnitude: 47, unit: 'pF', tolerance: '±5%' },
        problems: [],
      },
      { refDes: 'C2,C3', value: { magnitude: 0.01, unit: 'µF', tolerance: null } },
    ]);
    const csv = await editor.get(`/api/manuals/${manualId}/parts?format=csv`);
    expect(csv.text.split('\n')[1]).toBe('C1,22-1470,"Mica, 47 µµf ±5%",1,47,pF,±5%,1,');
  });
});

describe('references', () => {
  it('lead to what the manual has, and are listed where it has it not', async () => {
    const seen = doc(
      paragraph(text('See figure 5-3 and figure 9-9, and check C1.')),
      { type: 'caption', attrs: { of: 'figure', zone: [1, 2, 3, 4] }, content: [text('Figure 5-3. Chain')] },
      partsTable(),
    );
    await save(0, seen);
    const { body } = await editor.get(`/api/manuals/${manualId}/targets`);
    expect(body.items).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ kind: 'figure', name: '5-3', pageId, zone: [1, 2, 3, 4] }),
        expect.objectContaining({ kind: 'part', name: 'C3', pageId }),
      ]),
    );
    const open = () => editor.get(`/api/manuals/${manualId}/open-references`);
    expect((await open()).body.items).toMatchObject([{ text: 'figure 9-9', pageId }]);
    await save(1, doc(paragraph(text('See figure 5-3.'))));
    expect((await open()).body.items).toMatchObject([{ text: 'figure 5-3' }]);
  });
});

describe('page numbers', () => {
  it('are found in the running feet', async () => {
    await save(0, doc({ type: 'running', attrs: { place: 'foot' }, content: [text('5-3')] }, paragraph(text('x'))));
    expect((await editor.get(`/api/manuals/${manualId}/page-numbers`)).body).toEqual({
      pages: [{ pageId, label: '1', printed: '5-3' }],
      problems: [],
    });
  });
});

describe('searching', () => {
  const search = async (query: string) =>
    (await (await server.as('reader')).get(`/api/search?${query}&manualId=${manualId}`)).body;
  const q = (words: string): string => `q=${encodeURIComponent(words)}`;

  beforeEach(async () => {
    await save(
      0,
      doc(
        paragraph(
          word('Adjust', [1, 1, 9, 9]),
          text(' the '),
          word('oscillator', [20, 1, 90, 9]),
          text(' to '),
          word('0.455', [120, 1, 50, 9]),
          text(' '),
          word('MHz', [180, 1, 30, 9]),
        ),
        paragraph(word('Check', [1, 20, 9, 9]), text(' the '), word('injeclion', [20, 20, 90, 9]), text(' level')),
        partsTable(),
      ),
    );
    await eventually(
      () => search(q('oscillator')),
      ({ items }) => items.length > 0,
      5000,
    );
  });

  it('finds a word with its place in the text and on the scan', async () => {
    const { items, close } = await search(q('oscillator'));
    const [hit] = items;
    expect(close).toBe(false);
    expect(hit).toMatchObject({ kind: 'text', manualId, pageId, boxes: [[20, 1, 90, 9]] });
    const [[from, to]] = hit.marks;
    expect(hit.snippet.slice(from, to)).toBe('oscillator');
  });

  it('finds the start of a word, and words in a row', async () => {
    expect((await search(q('oscil'))).items).toHaveLength(1);
    expect((await search(q('adjus* oscillator'))).items).toHaveLength(1);
    expect((await search(q('"adjust the oscillator"'))).items).toHaveLength(1);
    expect((await search(q('"oscillator the adjust"'))).items).toHaveLength(0);
  });

  it('finds a quantity however it was written', async () => {
    const { items } = await search(q('455 kc'));
    expect(items[0]).toMatchObject({
      kind: 'quantity',
      boxes: [
        [120, 1, 50, 9],
        [180, 1, 30, 9],
      ],
    });
    expect((await search(`${q('456 kc')}&kind=quantity`)).items).toEqual([]);
  });

  it('finds a word that recognition has bent, and says that it is a near match', async () => {
    const { items, close } = await search(q('injection'));
    expect(close).toBe(true);
    expect(items[0]).toMatchObject({ boxes: [[20, 20, 90, 9]] });
  });

  it('finds rows of parts lists', async () => {
    const { items } = await search(`${q('24-4103')}&kind=part`);
    expect(items).toMatchObject([{ kind: 'part', snippet: expect.stringContaining('Paper, .01 mfd') }]);
  });

  it('takes whatever is typed for words, never for commands', async () => {
    for (const typed of ['"', 'NEAR(', 'a OR', '*', '-', 'body:x', "'; drop table pages", '(((', '%']) {
      expect((await (await server.as('reader')).get(`/api/search?${q(typed)}`)).status).toBe(200);
    }
    expect((await (await server.as('reader')).get('/api/search?q=')).status).toBe(400);
  });

  it('shows the corrected word and no longer the wrong one', async () => {
    await save(1, doc(paragraph(word('injection', [20, 20, 90, 9]))));
    await eventually(
      () => search(q('injection')),
      ({ items, close }) => items.length === 1 && close === false,
      5000,
    );
    expect((await search(q('oscillator'))).items).toEqual([]);
  });
});
