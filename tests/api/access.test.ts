import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Role, roles } from '#shared/access/roles.ts';
import { type TestServer, startTestServer } from '../helpers/server.ts';

type Operation = { 'x-role'?: Role };
type Route = { method: 'get' | 'post' | 'put' | 'patch' | 'delete'; path: string; lowest: Role };

let server: TestServer;
let routes: Route[];

beforeAll(async () => {
  server = await startTestServer();
  const { body } = await request(server.url).get('/api/openapi.json');
  routes = Object.entries(body.paths as Record<string, Record<string, Operation>>).flatMap(([path, operations]) =>
    Object.entries(operations).flatMap(([method, operation]) =>
      operation['x-role'] === undefined
        ? []
        : [{ method: method as Route['method'], path, lowest: operation['x-role'] }],
    ),
  );
});
afterAll(() => server.stop());

/** The status alone: a stream of events is cut as soon as it starts. */
async function statusOf({ method, path }: Route, cookie: string): Promise<number> {
  const filled = path.replace(/\{(\w+)\}/g, (_whole, name: string) =>
    name === 'number' ? '1' : 'nothing-of-this-name',
  );
  const stopper = new AbortController();
  const hasBody = method !== 'get' && method !== 'delete';
  const response = await fetch(server.url + filled, {
    method: method.toUpperCase(),
    headers: { cookie, ...(hasBody ? { 'content-type': 'application/json' } : {}) },
    ...(hasBody ? { body: '{}' } : {}),
    signal: stopper.signal,
  });
  stopper.abort();
  return response.status;
}

describe('every guarded route', () => {
  it('is in the description of the interface, and there are many', () => {
    expect(routes.length).toBeGreaterThan(35);
  });

  it('answers 401 to a stranger', async () => {
    for (const route of routes)
      expect([route.method, route.path, await statusOf(route, '')]).toEqual([route.method, route.path, 401]);
  });

  it.each(roles)('lets a %s do what the table says and nothing else', async (role) => {
    const { cookie } = await server.as(role);
    for (const route of routes) {
      const isAllowed = roles.indexOf(role) >= roles.indexOf(route.lowest);
      const status = await statusOf(route, cookie);
      expect([route.method, route.path, status === 403]).toEqual([route.method, route.path, !isAllowed]);
      expect(status).not.toBe(401);
      expect(status).toBeLessThan(500);
    }
  });
});

describe('the description of the interface', () => {
  const promised = [
    'get /api/health',
    'get /api/manuals',
    'post /api/manuals',
    'get /api/manuals/{manualId}',
    'patch /api/manuals/{manualId}',
    'delete /api/manuals/{manualId}',
    'post /api/manuals/{manualId}/sources',
    'get /api/manuals/{manualId}/pages',
    'get /api/pages/{pageId}',
    'get /api/pages/{pageId}/image',
    'get /api/pages/{pageId}/text',
    'get /api/pages/{pageId}/tables',
    'get /api/pages/{pageId}/reading',
    'post /api/pages/{pageId}/readings',
    'put /api/pages/{pageId}/document',
    'get /api/pages/{pageId}/revisions',
    'get /api/pages/{pageId}/revisions/{number}',
    'post /api/pages/{pageId}/revisions/{number}/restore',
    'get /api/manuals/{manualId}/parts',
    'get /api/manuals/{manualId}/quantities',
    'post /api/manuals/{manualId}/quantities',
    'patch /api/manuals/{manualId}/quantities/{quantityId}',
    'delete /api/manuals/{manualId}/quantities/{quantityId}',
    'post /api/manuals/{manualId}/evaluate',
    'get /api/manuals/{manualId}/proof',
    'get /api/manuals/{manualId}/settings',
    'post /api/manuals/{manualId}/settings',
    'get /api/search',
    'get /api/events',
    'get /api/me',
    'get /api/people',
    'post /api/people',
    'patch /api/people/{personId}',
    'get /api/audit',
    'get /api/outbox',
    'post /api/auth/sign-in/email',
    'post /api/auth/sign-out',
    'get /api/auth/get-session',
  ];

  it('holds every route that programs may rely on', async () => {
    const { body } = await request(server.url).get('/api/openapi.json');
    const described = Object.entries(body.paths as Record<string, object>).flatMap(([path, operations]) =>
      Object.keys(operations).map((method) => `${method} ${path}`),
    );
    expect(described).toEqual(expect.arrayContaining(promised));
    expect(body.openapi).toBe('3.1.0');
  });

  it('answers an unknown address with problem details', async () => {
    const response = await request(server.url).get('/api/nothing');
    expect(response.status).toBe(404);
    expect(response.type).toBe('application/problem+json');
    expect(response.body).toMatchObject({ status: 404, code: 'not-found' });
  });
});
