import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, type TestServer, eventually, startTestServer } from '../helpers/server.ts';
import { scanOf, sheet } from '../helpers/scans.ts';

let server: TestServer;
let archivist: Caller;
let manualId: string;
beforeAll(async () => {
  server = await startTestServer({ workers: 1 });
  archivist = await server.as('archivist');
  manualId = await archivist.newManual();
});
afterAll(() => server.stop());

const readPages = () =>
  eventually(
    () => archivist.pagesOf(manualId),
    (pages) => pages.every(({ state }) => state === 'read' || state === 'failed'),
  );

describe('a scanned PDF', () => {
  it('goes in at one end and comes out as pages that can be searched at the other', async () => {
    const events: string[] = [];
    const stopListening = server.tools.live.subscribe((event) => {
      if (event.type === 'page') events.push(event.page.state);
    });
    await archivist.upload(manualId, [{ name: 'two.pdf', bytes: await scanOf([sheet(1), sheet(2)]) }]);
    const pages = await readPages();
    stopListening();
    expect(pages).toMatchObject([
      { state: 'read', revision: 1 },
      { state: 'read', revision: 1 },
    ]);
    expect(events).toEqual(expect.arrayContaining(['reading', 'read']));

    const { body: page } = await archivist.get(`/api/pages/${pages[0].id}`);
    expect(page.document.content.map(({ type }: { type: string }) => type)).toEqual([
      'heading',
      'step',
      'step',
      'step',
    ]);
    expect(page.document.content[1].attrs).toMatchObject({ marker: 'a.', depth: 0 });
    expect((await archivist.get(`/api/pages/${pages[0].id}/text`)).text).toContain(
      'Tune the core of coil L5 for the greatest reading.',
    );

    const { body } = await archivist.get('/api/search?q=145.9%20mc');
    expect(body.items.filter(({ kind }: { kind: string }) => kind === 'quantity')).toHaveLength(2);
    const [x, y, w, h] = body.items[0].boxes[0];
    expect([x >= 0, y >= 0, w > 10, h > 5, x + w <= page.width, y + h <= page.height]).toEqual(Array(6).fill(true));
  });

  it('gives its words with boxes in the picture as read, and the way back to the picture as delivered', async () => {
    const [page] = await archivist.pagesOf(manualId);
    const { body: reading } = await archivist.get(`/api/pages/${page.id}/reading`);
    const heading = reading.words.find(({ text }: { text: string }) => text === 'ALIGNMENT');
    expect(heading.confidence).toBeGreaterThan(70);
    // Drawn 1 inch from the left and 1.6 from the top, at 300 dots an inch; the line's words follow "SECTION 1.".
    const [[a, b, c], [d, e, f]] = reading.transform;
    const [x, y] = heading.box;
    const delivered = [a * x + b * y + c, d * x + e * y + f];
    expect(delivered[1]).toBeGreaterThan(1.4 * 300);
    expect(delivered[1]).toBeLessThan(1.7 * 300);
    expect(reading.recipe).toMatchObject({ language: 'eng', dpi: 300 });
  });

  it('has pictures of its pages, whole, small and by zone', async () => {
    const [page] = await archivist.pagesOf(manualId);
    const picture = async (query: string) => {
      const reply = await fetch(`${server.url}/api/pages/${page.id}/image${query}`, {
        headers: { cookie: archivist.cookie },
      });
      return {
        type: reply.headers.get('content-type'),
        cache: reply.headers.get('cache-control'),
        bytes: (await reply.arrayBuffer()).byteLength,
      };
    };
    const whole = await picture('?v=1');
    expect(whole).toMatchObject({ type: 'image/jpeg', cache: 'private, max-age=31536000, immutable' });
    expect((await picture('?width=160')).bytes).toBeLessThan(whole.bytes / 10);
    expect((await picture('?zone=100,100,200,200')).type).toBe('image/jpeg');
    expect((await picture('?zone=99999,0,5,5')).type).toBe('image/jpeg');
  });

  it('can be read again with another recipe; what people wrote stays', async () => {
    const [page] = await archivist.pagesOf(manualId);
    const { body } = await archivist.get(`/api/pages/${page.id}`);
    const editor = await server.as('editor');
    const document = JSON.parse(JSON.stringify(body.document).replace('Tune', 'Turn'));
    expect((await editor.put(`/api/pages/${page.id}/document`, { baseRevision: 1, document })).status).toBe(200);
    await archivist.post(`/api/pages/${page.id}/readings`, { recipe: { skewDegrees: 2 } });
    const again = await eventually(
      () => archivist.get(`/api/pages/${page.id}`),
      (reply) => reply.body.revision === 3,
    );
    expect(again.body.state).toBe('corrected');
    expect((await archivist.get(`/api/pages/${page.id}/text`)).text).toContain('Turn the core of coil L5');
    const zoneOf = (reply: any) => reply.content[0].attrs.zone;
    expect(zoneOf(again.body.document)).not.toEqual(zoneOf(body.document));
    expect((await archivist.get(`/api/pages/${page.id}/reading`)).body.recipe.skewDegrees).toBe(2);
  });

  it('has one zone of it read again for an editor, in the pixels of its picture, and changes nothing', async () => {
    const [, page] = await archivist.pagesOf(manualId);
    const editor = await server.as('editor');
    const { body: before } = await editor.get(`/api/pages/${page.id}`);
    const step = before.document.content[2];
    const reply = await editor.post(`/api/pages/${page.id}/zone-readings`, { zone: step.attrs.zone, as: 'line' });
    expect(reply.status).toBe(200);
    expect(reply.body.words.map(({ text }: { text: string }) => text).join(' ')).toBe(
      'b. Tune the core of coil L5 for the greatest reading.',
    );
    expect(reply.body.blocks).toMatchObject([{ type: 'step', attrs: { marker: 'b.' } }]);
    const [x, y] = reply.body.words[0].box;
    expect(Math.abs(x - step.attrs.zone[0])).toBeLessThan(12);
    expect(Math.abs(y - step.attrs.zone[1])).toBeLessThan(20);
    expect((await editor.get(`/api/pages/${page.id}`)).body.revision).toBe(before.revision);
    const outside = await editor.post(`/api/pages/${page.id}/zone-readings`, { zone: [90_000, 10, 40, 40] });
    expect(outside).toMatchObject({ status: 422, body: { detail: expect.stringContaining('outside the page') } });
    const reader = await server.as('reader');
    expect((await reader.post(`/api/pages/${page.id}/zone-readings`, { zone: [0, 0, 9, 9] })).status).toBe(403);
  });

  it('waits while its manual is paused, and stops when it is cancelled', async () => {
    const other = await archivist.newManual('Paused');
    await archivist.post(`/api/manuals/${other}/reading-queue`, { do: 'pause' });
    await archivist.upload(other, [{ name: 'p.pdf', bytes: await scanOf([sheet(8), sheet(9)]) }]);
    await new Promise((resolve) => setTimeout(resolve, 1500));
    expect(await archivist.pagesOf(other)).toMatchObject([{ state: 'waiting' }, { state: 'waiting' }]);
    await archivist.post(`/api/manuals/${other}/reading-queue`, { do: 'cancel' });
    await archivist.post(`/api/manuals/${other}/reading-queue`, { do: 'resume' });
    const pages = await archivist.pagesOf(other);
    expect(pages).toMatchObject([
      { state: 'failed', problem: expect.stringContaining('cancelled') },
      { state: 'failed' },
    ]);
    await archivist.post(`/api/manuals/${other}/reading-queue`, { do: 'retry' });
    await eventually(
      () => archivist.pagesOf(other),
      (now) => now.every(({ state }) => state === 'read'),
    );
  });
});
