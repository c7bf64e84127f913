import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type TestServer, startTestServer } from '../helpers/server.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

describe('a manual', () => {
  it('is added by an archivist, with what is known of it', async () => {
    const archivist = await server.as('archivist');
    const reply = await archivist.post('/api/manuals', {
      title: ' SG-4 Signal Generator ',
      documentNumber: 'TW 204-1',
    });
    expect(reply).toMatchObject({
      status: 201,
      body: { title: 'SG-4 Signal Generator', documentNumber: 'TW 204-1', maker: null, deletedAt: null },
    });
    const reader = await server.as('reader');
    expect((await reader.get(`/api/manuals/${reply.body.id}`)).body).toMatchObject({
      title: 'SG-4 Signal Generator',
      pageCounts: { all: 0 },
    });
  });

  it('needs a title', async () => {
    const reply = await (await server.as('archivist')).post('/api/manuals', { title: '   ' });
    expect(reply).toMatchObject({ status: 400, body: { code: 'invalid-input', issues: [{ path: 'title' }] } });
  });

  it('is changed a fact at a time, and a fact can be emptied', async () => {
    const archivist = await server.as('archivist');
    const id = await archivist.newManual('A');
    await archivist.patch(`/api/manuals/${id}`, { equipment: 'HB-12', maker: null });
    expect((await archivist.get(`/api/manuals/${id}`)).body).toMatchObject({
      title: 'A',
      equipment: 'HB-12',
      maker: null,
    });
  });

  it('goes to the bin and comes back', async () => {
    const archivist = await server.as('archivist');
    const id = await archivist.newManual('Binned');
    const titles = async (query = '') =>
      (await archivist.get(`/api/manuals${query}`)).body.items.map(({ title }: { title: string }) => title);
    expect((await archivist.delete(`/api/manuals/${id}`)).status).toBe(200);
    expect((await archivist.get(`/api/manuals/${id}`)).status).toBe(404);
    expect(await titles()).not.toContain('Binned');
    expect(await titles('?bin=true')).toContain('Binned');
    expect((await archivist.post(`/api/manuals/${id}/restore`)).status).toBe(200);
    expect(await titles()).toContain('Binned');
  });

  it('is listed page by page', async () => {
    const reader = await server.as('reader');
    const first = await reader.get('/api/manuals?limit=2');
    expect(first.body.items).toHaveLength(2);
    const second = await reader.get(`/api/manuals?limit=2&cursor=${first.body.nextCursor}`);
    const ids = [...first.body.items, ...second.body.items].map(({ id }: { id: string }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect((await reader.get('/api/manuals?cursor=nonsense')).status).toBe(400);
  });

  it('can have its reading paused and gone on with', async () => {
    const archivist = await server.as('archivist');
    const id = await archivist.newManual();
    await archivist.post(`/api/manuals/${id}/reading-queue`, { do: 'pause' });
    expect((await archivist.get(`/api/manuals/${id}`)).body.reading).toBe('paused');
    await archivist.post(`/api/manuals/${id}/reading-queue`, { do: 'resume' });
    expect((await archivist.get(`/api/manuals/${id}`)).body.reading).toBe('running');
    expect((await archivist.post(`/api/manuals/${id}/reading-queue`, { do: 'explode' })).status).toBe(400);
  });
});

describe('a request that is not well formed', () => {
  it('is told so', async () => {
    const archivist = await server.as('archivist');
    const response = await fetch(`${server.url}/api/manuals`, {
      method: 'POST',
      headers: { cookie: archivist.cookie, 'content-type': 'application/json' },
      body: '{ not json',
    });
    expect(response.status).toBe(400);
    expect(await response.json()).toMatchObject({ code: 'invalid-input' });
  });
});
