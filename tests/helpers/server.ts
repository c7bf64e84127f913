import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { readConfig } from '#server/config/config.ts';
import { seedWhenNew } from '#server/demo/seed.ts';
import { type Running, startServer } from '#server/start.ts';
import { type Role, roles } from '#shared/access/roles.ts';
import { projectRoot } from '#server/db/database.ts';

export const password = 'bench-password';
export const addressOf = (role: Role): string => `${role}@test.example`;
export const workerScript = {
  script: path.join(projectRoot, 'server/worker.ts'),
  execArgv: ['--max-old-space-size=700', '--import', 'tsx'],
};

export type TestServer = Running & { dataDir: string; as: (role: Role) => Promise<Caller> };

/** A server on a fresh data folder and a free port, with one person of each role. `workers: 0` reads nothing. */
export async function startTestServer({
  workers = 0,
  env = {},
}: { workers?: number; env?: Record<string, string> } = {}): Promise<TestServer> {
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-test-'));
  const config = readConfig({
    NODE_ENV: 'test',
    PORT: '0',
    DATA_DIR: dataDir,
    SEED: 'none',
    LOG_LEVEL: 'silent',
    RECOGNITION_WORKERS: String(workers),
    ...env,
  });
  const running = await startServer(config, workerScript);
  for (const role of roles) {
    await running.tools.auth.api.createUser({ body: { email: addressOf(role), name: `Test ${role}`, password, role } });
  }
  const callers = new Map<Role, Promise<Caller>>();
  return {
    ...running,
    dataDir,
    as(role) {
      const caller = callers.get(role) ?? Caller.signIn(running.url, addressOf(role), password);
      callers.set(role, caller);
      return caller;
    },
    async stop() {
      await running.stop();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}

/** A server with the demo on it, as a first start makes it, its manuals being read. */
export async function startDemoServer(): Promise<Omit<TestServer, 'as'>> {
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-demo-'));
  const env = {
    NODE_ENV: 'test',
    PORT: '0',
    DATA_DIR: dataDir,
    SEED: 'demo',
    LOG_LEVEL: 'silent',
    RECOGNITION_WORKERS: '1',
  };
  const running = await startServer(readConfig(env), workerScript);
  await seedWhenNew(running);
  return {
    ...running,
    dataDir,
    async stop() {
      await running.stop();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}

export const demoPerson = (name: 'reader' | 'technician' | 'editor' | 'archivist' | 'admin') => ({
  email: `${name}@benchleaf.example`,
  password: 'benchleaf-demo',
});

export type Reply = { status: number; body: any; text: string; headers: Record<string, string> };
type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** Calls the server over HTTP with the cookies of one signed-in person; without cookies, as a stranger. */
export class Caller {
  constructor(
    readonly url: string,
    readonly cookie = '',
  ) {}

  static async signIn(url: string, email: string, secret: string): Promise<Caller> {
    const response = await request(url)
      .post('/api/auth/sign-in/email')
      .set('Origin', url)
      .send({ email, password: secret });
    if (response.status !== 200) throw new Error(`${email}: ${response.status} ${response.text}`);
    const cookies = response.headers['set-cookie'] as unknown as string[];
    return new Caller(url, cookies.map((each) => each.split(';')[0]).join('; '));
  }

  async send(method: Method, at: string, body?: object): Promise<Reply> {
    const call = request(this.url)[method](at).set('Cookie', this.cookie);
    return await (body === undefined ? call : call.send(body));
  }

  get = (at: string): Promise<Reply> => this.send('get', at);
  post = (at: string, body: object = {}): Promise<Reply> => this.send('post', at, body);
  put = (at: string, body: object): Promise<Reply> => this.send('put', at, body);
  patch = (at: string, body: object): Promise<Reply> => this.send('patch', at, body);
  delete = (at: string): Promise<Reply> => this.send('delete', at);

  async upload(manualId: string, files: { name: string; bytes: Uint8Array }[]): Promise<Reply> {
    const call = request(this.url).post(`/api/manuals/${manualId}/sources`).set('Cookie', this.cookie);
    for (const { name, bytes } of files) call.attach('files', Buffer.from(bytes), name);
    return await call;
  }

  async newManual(title = 'HB-12 Harbour Receiver'): Promise<string> {
    return (await this.post('/api/manuals', { title, maker: 'Tarnholt Works' })).body.id as string;
  }

  async pagesOf(manualId: string): Promise<any[]> {
    return (await this.get(`/api/manuals/${manualId}/pages`)).body.items as any[];
  }
}

/** Looks again until something holds; fails loudly, with what it last saw, when it never does. */
export async function eventually<T>(
  look: () => Promise<T>,
  holds: (seen: T) => boolean,
  withinMs = 120_000,
): Promise<T> {
  const end = Date.now() + withinMs;
  for (;;) {
    const seen = await look();
    if (holds(seen)) return seen;
    if (Date.now() > end)
      throw new Error(
        `It did not come to hold within ${withinMs} ms. Last seen: ${JSON.stringify(seen).slice(0, 2000)}`,
      );
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}
