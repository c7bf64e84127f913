import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { text } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { FileStore } from './file-store.ts';
import { folderStore } from './folder-store.ts';
import { s3Store } from './s3-store.ts';

const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-store-'));

/** As much of the S3 protocol as putting, getting and removing an object needs, over a map. */
function fakeBucket(): http.Server {
  const objects = new Map<string, Buffer>();
  return http.createServer((request, response) => {
    const key = new URL(request.url ?? '/', 'http://x').pathname;
    const chunks: Buffer[] = [];
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      if (request.method === 'PUT') objects.set(key, Buffer.concat(chunks));
      if (request.method === 'DELETE') objects.delete(key);
      const body = objects.get(key);
      if (request.method === 'GET' && body === undefined) {
        response.writeHead(404, { 'content-type': 'application/xml' }).end('<Error><Code>NoSuchKey</Code></Error>');
      } else response.writeHead(200).end(request.method === 'GET' ? body : undefined);
    });
  });
}

const server = fakeBucket();
const stores: Record<string, () => FileStore> = {
  'a folder': () => folderStore(path.join(folder, 'files')),
  'an S3 bucket': () => {
    const endpoint = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
    return s3Store({ bucket: 'manuals', endpoint, region: 'us-east-1' }, path.join(folder, 'cache'));
  },
};

beforeAll(async () => {
  process.env['AWS_ACCESS_KEY_ID'] = 'test';
  process.env['AWS_SECRET_ACCESS_KEY'] = 'test';
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
});
afterAll(() => server.close());

describe.each(Object.keys(stores))('%s', (name) => {
  it('takes a file in, gives it back as a stream and as a local file, and removes it', async () => {
    const store = stores[name]?.() as FileStore;
    const local = path.join(folder, 'sheet.txt');
    writeFileSync(local, 'tune L5');
    await store.put('sources/ab/abc', local);
    expect(() => readFileSync(local)).toThrow();
    expect(readFileSync(await store.localPath('sources/ab/abc'), 'utf8')).toBe('tune L5');
    await store.remove('sources/ab/abc');
    await expect(store.localPath('sources/ab/abc')).rejects.toThrow();
  });

  it('says so when there is nothing under a key', async () => {
    const store = stores[name]?.() as FileStore;
    await expect(store.read('nothing').then(text)).rejects.toThrow();
  });
});

describe('a folder', () => {
  it('is never left, whatever the key', async () => {
    await expect(folderStore(folder).localPath('../../etc/passwd')).rejects.toThrow('leads out');
  });
});
