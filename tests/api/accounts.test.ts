import request from 'supertest';
import { SMTPServer } from 'smtp-server';
import { getAuthTables } from 'better-auth/db';
import { getTableColumns } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as schema from '#server/db/schema/index.ts';
import { Caller, type TestServer, addressOf, password, startTestServer } from '../helpers/server.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

const tokenIn = (text: string): string => /token=([^\s&]+)/.exec(text)?.[1] ?? '';

describe('an invitation', () => {
  it('goes out by e-mail, lets its person choose a password once, and sign in', async () => {
    const admin = await server.as('administrator');
    const invited = await admin.post('/api/people', {
      name: 'Nils New',
      email: 'nils@test.example',
      role: 'technician',
    });
    expect(invited).toMatchObject({ status: 201, body: { state: 'invited', role: 'technician' } });

    const { items } = (await admin.get('/api/outbox')).body;
    expect(items[0]).toMatchObject({ to: 'nils@test.example', subject: 'You are invited to Benchleaf' });
    const reset = { newPassword: 'a-new-password', token: tokenIn(items[0].text) };
    const choose = () => request(server.url).post('/api/auth/reset-password').set('Origin', server.url).send(reset);
    expect((await choose()).status).toBe(200);
    expect((await choose()).status).toBe(400);

    const nils = await Caller.signIn(server.url, 'nils@test.example', 'a-new-password');
    expect((await nils.get('/api/me')).body).toMatchObject({ name: 'Nils New', role: 'technician' });
    const again = await admin.post(`/api/people/${invited.body.id}/invitation`);
    expect(again).toMatchObject({ status: 409, body: { code: 'wrong-state' } });
  });

  it('is refused for an address that is known', async () => {
    const admin = await server.as('administrator');
    const reply = await admin.post('/api/people', { name: 'Twice', email: addressOf('reader'), role: 'reader' });
    expect(reply).toMatchObject({ status: 409, body: { code: 'already-exists' } });
  });

  it('names the field that is wrong', async () => {
    const admin = await server.as('administrator');
    const reply = await admin.post('/api/people', { name: 'X', email: 'no address', role: 'wizard' });
    expect(reply.status).toBe(400);
    expect(reply.body.issues.map(({ path }: { path: string }) => path).sort()).toEqual(['email', 'role']);
  });
});

describe('a forgotten password', () => {
  it('is replaced through a link that is mailed; an unknown address gets the same answer and no mail', async () => {
    const ask = (email: string) =>
      request(server.url).post('/api/auth/request-password-reset').set('Origin', server.url).send({ email });
    expect((await ask(addressOf('editor'))).status).toBe(200);
    expect((await ask('nobody@test.example')).status).toBe(200);
    const { items } = (await (await server.as('administrator')).get('/api/outbox')).body;
    expect(items[0]).toMatchObject({ to: addressOf('editor'), subject: 'Choose a new password for Benchleaf' });
    expect(items.some(({ to }: { to: string }) => to === 'nobody@test.example')).toBe(false);
  });
});

describe('people', () => {
  it('get another role at once', async () => {
    const admin = await server.as('administrator');
    const reader = await server.as('reader');
    const { body: me } = await reader.get('/api/me');
    expect((await reader.post('/api/manuals', { title: 'x' })).status).toBe(403);
    expect((await admin.patch(`/api/people/${me.id}`, { role: 'archivist' })).status).toBe(200);
    expect((await reader.post('/api/manuals', { title: 'x' })).status).toBe(201);
    await admin.patch(`/api/people/${me.id}`, { role: 'reader' });
  });

  it('who are barred lose their session and cannot sign in', async () => {
    const admin = await server.as('administrator');
    const technician = await server.as('technician');
    const { body: me } = await technician.get('/api/me');
    await admin.patch(`/api/people/${me.id}`, { barred: true });
    expect((await technician.get('/api/me')).status).toBe(401);
    await expect(Caller.signIn(server.url, addressOf('technician'), password)).rejects.toThrow('403');
    await admin.patch(`/api/people/${me.id}`, { barred: false });
    await expect(Caller.signIn(server.url, addressOf('technician'), password)).resolves.toBeInstanceOf(Caller);
  });

  it('always keep one administrator among them', async () => {
    const admin = await server.as('administrator');
    const { body: me } = await admin.get('/api/me');
    expect(await admin.patch(`/api/people/${me.id}`, { role: 'reader' })).toMatchObject({ status: 409 });
    expect(await admin.patch(`/api/people/${me.id}`, { barred: true })).toMatchObject({ status: 409 });
  });

  it('leave a line in the audit trail with every change', async () => {
    const { items } = (await (await server.as('administrator')).get('/api/audit')).body;
    expect(items.map(({ did }: { did: string }) => did)).toEqual(
      expect.arrayContaining(['invited', 'changed a person', 'added a manual']),
    );
  });
});

describe('with a mail server configured', () => {
  it('invitations go through it, and there is no outbox', async () => {
    const received: string[] = [];
    const smtp = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'],
      onData(stream, _session, done) {
        stream.on('data', (chunk: Buffer) => received.push(chunk.toString()));
        stream.on('end', done);
      },
    });
    await new Promise<void>((resolve) => smtp.listen(0, '127.0.0.1', () => resolve()));
    const { port } = smtp.server.address() as { port: number };
    const own = await startTestServer({ env: { SMTP_URL: `smtp://127.0.0.1:${port}` } });
    const admin = await own.as('administrator');
    expect((await admin.post('/api/people', { name: 'Mia', email: 'mia@test.example', role: 'reader' })).status).toBe(
      201,
    );
    expect(received.join('')).toContain('To: mia@test.example');
    expect((await admin.get('/api/outbox')).status).toBe(404);
    await own.stop();
    await new Promise<void>((resolve) => smtp.close(() => resolve()));
  });
});

// Last, because it uses up the sign-ins of a minute.
describe('the door', () => {
  it('is closed to sign-up and to the sign-in library\u2019s own administration', async () => {
    const up = await request(server.url)
      .post('/api/auth/sign-up/email')
      .set('Origin', server.url)
      .send({ email: 'a@b.example', password: 'long-enough-1', name: 'A' });
    expect(up.status).toBe(400);
    const admin = await server.as('administrator');
    expect((await admin.get('/api/auth/admin/list-users')).status).toBe(404);
  });

  it('refuses changes that come from another site', async () => {
    const admin = await server.as('administrator');
    const reply = await request(server.url)
      .post('/api/manuals')
      .set('Cookie', admin.cookie)
      .set('Origin', 'https://elsewhere.example')
      .send({ title: 'x' });
    expect(reply.status).toBe(403);
  });

  it('slows down whoever guesses passwords', async () => {
    const guess = () =>
      request(server.url)
        .post('/api/auth/sign-in/email')
        .set('Origin', server.url)
        .send({ email: addressOf('reader'), password: 'wrong-password' });
    const statuses: number[] = [];
    for (let tries = 0; tries < 40; tries += 1) statuses.push((await guess()).status);
    expect(statuses[0]).toBe(401);
    expect(statuses.at(-1)).toBe(429);
  });
});

describe('the tables of accounts', () => {
  it('have every field that the sign-in library asks for', () => {
    const tables = getAuthTables(server.tools.auth.options);
    for (const { modelName, fields } of Object.values(tables)) {
      const ours = (schema as unknown as Record<string, Parameters<typeof getTableColumns>[0]>)[modelName];
      if (ours === undefined) {
        // Only its counters of requests, which are kept in memory.
        expect(modelName).toBe('rateLimit');
        continue;
      }
      expect(Object.keys(getTableColumns(ours))).toEqual(expect.arrayContaining(Object.keys(fields)));
    }
  });
});
