import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, type TestServer, startTestServer } from '../helpers/server.ts';
import { drawSheet, scanOf, sheet } from '../helpers/scans.ts';

let server: TestServer;
let archivist: Caller;
beforeAll(async () => {
  server = await startTestServer({ env: { MAX_UPLOAD_MB: '3', MAX_PAGES: '20' } });
  archivist = await server.as('archivist');
});
afterAll(() => server.stop());

const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
const takeIn = async (name: string, bytes: Uint8Array) =>
  archivist.upload(await archivist.newManual(), [{ name, bytes }]);

describe('a source', () => {
  it('is kept byte for byte under its SHA-256, and comes back the same', async () => {
    const bytes = await scanOf([sheet(1), sheet(2)]);
    const manualId = await archivist.newManual();
    const reply = await archivist.upload(manualId, [{ name: 'HB-12.pdf', bytes }]);
    expect(reply).toMatchObject({ status: 202 });
    const [item] = reply.body.items;
    expect(item).toMatchObject({
      fileName: 'HB-12.pdf',
      sha256: sha256(bytes),
      bytes: bytes.length,
      mediaType: 'application/pdf',
      pageCount: 2,
      state: 'ready',
    });
    const kept = readFileSync(path.join(server.dataDir, 'files/sources', item.sha256.slice(0, 2), item.sha256));
    expect(sha256(kept)).toBe(item.sha256);
    const back = await archivist.get(`/api/sources/${item.id}/file`);
    expect(back.headers['content-disposition']).toContain('HB-12.pdf');
    expect(Number(back.headers['content-length'])).toBe(bytes.length);
    expect(await archivist.pagesOf(manualId)).toMatchObject([
      { position: 1, label: '1', state: 'waiting', revision: 0 },
      { position: 2, label: '2', state: 'waiting', revision: 0 },
    ]);
  });

  it('is taken once, however often the same bytes come', async () => {
    const manualId = await archivist.newManual();
    const bytes = drawSheet(sheet(3));
    const first = await archivist.upload(manualId, [{ name: 'a.jpg', bytes }]);
    const second = await archivist.upload(manualId, [{ name: 'b.jpg', bytes }]);
    expect(second).toMatchObject({
      status: 202,
      body: { items: [{ id: first.body.items[0].id, state: 'duplicate' }] },
    });
    expect(second.body.items[0].problem).toContain('a.jpg');
    expect(await archivist.pagesOf(manualId)).toHaveLength(1);
  });

  it('may be a picture of any kind that is scanned, told by its bytes and not by its name', async () => {
    const picture = sharp(drawSheet(sheet(4), 'image/png'));
    const kinds: [string, Buffer, string][] = [
      ['sheet.dat', await picture.clone().png().toBuffer(), 'image/png'],
      ['sheet.pdf', await picture.clone().jpeg().toBuffer(), 'image/jpeg'],
      ['sheet', await picture.clone().webp().toBuffer(), 'image/webp'],
      ['sheet.exe', await picture.clone().tiff({ compression: 'lzw' }).toBuffer(), 'image/tiff'],
    ];
    for (const [name, bytes, mediaType] of kinds) {
      expect(await takeIn(name, bytes)).toMatchObject({ status: 202, body: { items: [{ mediaType, pageCount: 1 }] } });
    }
  });

  it('with several pages in one TIFF brings as many pages', async () => {
    const { data, info } = await sharp(drawSheet(sheet(5)))
      .greyscale()
      .toColourspace('b-w')
      .raw()
      .toBuffer({ resolveWithObject: true });
    const bytes = await sharp(Buffer.concat([data, data, data]), {
      raw: { width: info.width, height: info.height * 3, channels: 1, pageHeight: info.height },
    })
      .tiff()
      .toBuffer();
    expect(await takeIn('three.tif', bytes)).toMatchObject({ status: 202, body: { items: [{ pageCount: 3 }] } });
  });

  it('keeps the last part of its name only, wherever the path it was sent with would lead', async () => {
    const reply = await takeIn('../../../etc/passwd', drawSheet(sheet(6)));
    expect(reply.body.items[0].fileName).toBe('passwd');
    expect(existsSync(path.join(server.dataDir, '..', 'etc'))).toBe(false);
  });
});

describe('a file that cannot be taken', () => {
  it('says why, each in its own words, and does not stop the others', async () => {
    const manualId = await archivist.newManual();
    const good = await scanOf([sheet(7)]);
    const files = [
      { name: 'empty.pdf', bytes: new Uint8Array() },
      { name: 'program.pdf', bytes: Buffer.from('MZ\u0090\u0000 this is no scan') },
      { name: 'good.pdf', bytes: good },
      { name: 'cut.pdf', bytes: good.slice(0, 900) },
      { name: 'big.jpg', bytes: new Uint8Array(3.5 * 1024 * 1024) },
      { name: 'many.pdf', bytes: await scanOf(Array.from({ length: 21 }, () => [''])) },
    ];
    const { status, body } = await archivist.upload(manualId, files);
    expect(status).toBe(202);
    const said = Object.fromEntries(
      body.items.map(({ fileName, state, problem }: any) => [fileName, `${state}: ${problem}`]),
    );
    expect(said).toEqual({
      'empty.pdf': expect.stringMatching(/^refused: .*empty/),
      'program.pdf': expect.stringMatching(/^refused: .*not a PDF/),
      'good.pdf': 'ready: null',
      'cut.pdf': expect.stringMatching(/^refused: .*damaged or cut short/),
      'big.jpg': expect.stringMatching(/^refused: .*larger than the 3 MB/),
      'many.pdf': expect.stringMatching(/^refused: .*21 pages; up to 20/),
    });
    expect(await archivist.pagesOf(manualId)).toHaveLength(1);
  });

  it.each([
    ['too-large', 413, new Uint8Array(3.2 * 1024 * 1024)],
    ['wrong-kind', 415, Buffer.from('GIF89a is not read here')],
    ['cannot-do', 422, new Uint8Array()],
  ])('alone is a %s, %i', async (code, status, bytes) => {
    const reply = await takeIn('one.bin', bytes);
    expect(reply).toMatchObject({ status, body: { code } });
    expect(reply.body.items).toHaveLength(1);
  });

  it('leaves nothing behind on the disk', () => {
    const incoming = path.join(server.dataDir, 'incoming');
    expect(existsSync(incoming) ? readdirSync(incoming) : []).toEqual([]);
  });

  it('is refused for a manual that is not there', async () => {
    expect((await archivist.upload('nowhere', [{ name: 'a.jpg', bytes: drawSheet(sheet(1)) }])).status).toBe(404);
  });
});
