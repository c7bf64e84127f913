import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** The key that signs session cookies: made on the first start, readable by the owner alone, kept out of backups. */
export function readOrCreateSecret(dataDir: string): string {
  const file = path.join(dataDir, 'secret');
  mkdirSync(dataDir, { recursive: true });
  try {
    // wx: of two starts at once only one writes, and the other reads what it wrote.
    writeFileSync(file, randomBytes(48).toString('base64url'), { flag: 'wx', mode: 0o600 });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
  return readFileSync(file, 'utf8').trim();
}
