import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { projectRoot } from '#server/db/database.ts';

const client = path.join(projectRoot, 'dist/client');
/** What the first load may weigh before editor, scan viewer and engine are needed. */
const budgetBytes = 250_000;

const zipped = (file: string): number => gzipSync(readFileSync(path.join(client, file)), { level: 9 }).length;
const kilobytes = (bytes: number): string => `${(bytes / 1000).toFixed(1)} kB`;

/** The scripts that a file pulls in before anything shows: its static imports, and theirs. */
function closure(file: string, seen = new Set<string>()): Set<string> {
  if (seen.has(file)) return seen;
  seen.add(file);
  const source = readFileSync(path.join(client, file), 'utf8');
  for (const match of source.matchAll(
    /(?:^|[;}\n])\s*(?:import|export)\s*(?:[^'"()]*?from\s*)?["']\.\/([\w.-]+\.js)["']/g,
  )) {
    closure(path.posix.join(path.posix.dirname(file), match[1] ?? ''), seen);
  }
  return seen;
}

/** The scripts of the first load, compressed. */
export function firstLoad(): { files: string[]; bytes: number } {
  const html = readFileSync(path.join(client, 'index.html'), 'utf8');
  const entries = [...html.matchAll(/(?:src|href)="\/(assets\/[\w.-]+\.js)"/g)].map((match) => match[1] ?? '');
  const files = [...entries.reduce((all, entry) => closure(entry, all), new Set<string>())];
  return { files, bytes: files.reduce((sum, file) => sum + zipped(file), 0) };
}

export function benchSizes(): string[] {
  if (!existsSync(path.join(client, 'index.html'))) return ['The client is not built: npm run build'];
  const { files, bytes } = firstLoad();
  const scripts = readdirSync(path.join(client, 'assets')).filter((name) => name.endsWith('.js'));
  const largest = scripts
    .map((name) => ({ name, bytes: zipped(`assets/${name}`) }))
    .sort((a, b) => b.bytes - a.bytes)
    .slice(0, 6);
  return [
    `first load: ${kilobytes(bytes)} of compressed scripts in ${files.length} files; budget ${kilobytes(budgetBytes)}; ratio ${(bytes / budgetBytes).toFixed(2)}`,
    ...largest.map(({ name, bytes: size }) => `${name}: ${kilobytes(size)}`),
  ];
}
