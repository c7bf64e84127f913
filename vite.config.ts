import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

// The e2e project runs one file after the other: each starts a server of its own with a recognition worker, and two
// cores carry no more.
export default defineConfig({
  plugins: [react(), tailwindcss()],
  // Two copies of the shared-text library would not know each other's texts.
  resolve: { dedupe: ['yjs'] },
  // The editor and the scan viewer are large, and are only fetched with the screens that need them.
  build: { outDir: 'dist/client', chunkSizeWarningLimit: 900 },
  server: {
    host: '127.0.0.1',
    proxy: { '/api': { target: process.env['API_URL'] ?? 'http://127.0.0.1:3000', changeOrigin: false, ws: true } },
  },
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: ['shared/**/*.test.ts', 'server/**/*.test.ts', 'tests/{architecture,migrations}/**/*.test.ts'],
        },
      },
      { plugins: [react()], test: { name: 'client', environment: 'jsdom', include: ['src/**/*.test.{ts,tsx}'] } },
      {
        test: {
          name: 'api',
          include: ['tests/{api,pipeline}/**/*.test.ts'],
          testTimeout: 240_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
      {
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 240_000,
          hookTimeout: 240_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
