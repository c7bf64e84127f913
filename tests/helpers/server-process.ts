import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { readOrCreateSecret } from '#server/config/secret.ts';
import { openDatabase, projectRoot } from '#server/db/database.ts';
import { createAuth } from '#server/features/accounts/index.ts';
import type { Role } from '#shared/access/roles.ts';
import { addressOf, password } from './server.ts';

/** The server as a process of its own, as a person starts it, on a data folder that outlives it. */
export class ServerProcess {
  readonly dataDir: string;
  private child: ChildProcess | null = null;

  constructor(
    name: string,
    private readonly env: Record<string, string> = {},
  ) {
    this.dataDir = mkdtempSync(path.join(os.tmpdir(), `benchleaf-${name}-`));
  }

  /** Starts it and waits until it says that it is ready. Answers its address. */
  start(): Promise<string> {
    const env = {
      ...process.env,
      ...{ NODE_ENV: 'test', PORT: '0', DATA_DIR: this.dataDir, SEED: 'none', LOG_LEVEL: 'silent' },
      ...this.env,
    };
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
      cwd: projectRoot,
      env,
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    this.child = child;
    let said = '';
    return new Promise((resolve, reject) => {
      child.stdout.on('data', (chunk: Buffer) => {
        said += chunk.toString();
        const url = /ready at (\S+)/.exec(said)?.[1];
        if (url !== undefined) resolve(url);
      });
      child.on('exit', (code) => reject(new Error(`The server ended with ${code}: ${said}`)));
    });
  }

  kill(signal: NodeJS.Signals): Promise<number | null> {
    const dying = this.child;
    const ended = new Promise<number | null>((resolve) => dying?.on('exit', (code) => resolve(code)));
    dying?.kill(signal);
    this.child = null;
    return ended;
  }

  /** Ends it whatever it is doing, and takes its data away. */
  remove(): void {
    this.child?.kill('SIGKILL');
    rmSync(this.dataDir, { recursive: true, force: true });
  }

  /** Adds a person while the server does not run. */
  async addPerson(role: Role): Promise<void> {
    const { db, close } = openDatabase(this.dataDir);
    const publicUrl = 'http://127.0.0.1';
    const secret = readOrCreateSecret(this.dataDir);
    const auth = createAuth({ db }, { secret, publicUrl, trustedOrigins: [], sendMail: () => Promise.resolve() });
    await auth.api.createUser({ body: { email: addressOf(role), name: `Test ${role}`, password, role } });
    close();
  }
}

/** A port that nobody listens on, for a server that must come back under the same address. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        typeof address === 'object' && address !== null ? resolve(address.port) : reject(new Error('no port')),
      );
    });
  });
}
