// Bundles the server and its worker process. Packages stay outside: they carry native code and data files.
import { build } from 'esbuild';

await build({
  entryPoints: ['server/main.ts', 'server/worker.ts', 'server/scripts/admin-create.ts'],
  outdir: 'dist/server',
  entryNames: '[name]',
  bundle: true,
  splitting: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: true,
  logLevel: 'warning',
});
