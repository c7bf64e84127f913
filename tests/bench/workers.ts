import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { projectRoot } from '#server/db/database.ts';
import type { DrawInput } from '#server/features/pages/draw.ts';
import { WorkerProcess } from '#server/jobs/worker-pool.ts';

const pages = Array.from({ length: 10 }, (_, index) => index);
/** No limit: it is the need that is measured. */
const limits = { memoryBytes: 8e9, timeoutMs: 600_000 };

/**
 * Draws and reads ten pages of a demo manual in one worker process and then in two, as the server does: what one needs
 * of memory at its peak, and how many more pages two read in the same time. `two=no` leaves the second part out.
 */
export async function benchWorkers(args: readonly string[] = []): Promise<string[]> {
  if (process.platform !== 'linux') return ['left out: memory is read from /proc'];
  execFileSync(process.execPath, ['server/scripts/build.mjs'], { cwd: projectRoot });
  const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-workers-'));
  const one = await readWith(1, folder);
  const two = args.includes('two=no') ? null : await readWith(2, folder);
  rmSync(folder, { recursive: true });
  const perMinute = (seconds: number): string => `${((pages.length / seconds) * 60).toFixed(1)} pages a minute`;
  return [
    `one worker: ${perMinute(one.seconds)}, at most ${one.peakMb} MB resident`,
    ...(two === null ? [] : [`two: ${perMinute(two.seconds)}; two to one: ${(one.seconds / two.seconds).toFixed(2)}`]),
  ];
}

async function readWith(count: number, folder: string): Promise<{ seconds: number; peakMb: number }> {
  const script = path.join(projectRoot, 'dist/server/worker.js');
  const workers = Array.from({ length: count }, () => new WorkerProcess({ script, execArgv: [], ...limits }));
  const waiting = [...pages];
  const from = performance.now();
  await Promise.all(
    workers.map(async (worker) => {
      for (let page = waiting.shift(); page !== undefined; page = waiting.shift()) await readOne(worker, page, folder);
    }),
  );
  const seconds = (performance.now() - from) / 1000;
  const peakMb = Math.max(...childrenPeaksMb());
  for (const worker of workers) worker.stop();
  return { seconds, peakMb };
}

async function readOne(worker: WorkerProcess, sourcePage: number, folder: string): Promise<void> {
  const source = path.join(projectRoot, 'server/demo/manuals/hb-12.pdf');
  const drawn = path.join(folder, `${sourcePage}.jpg`);
  await worker.run('draw', {
    path: source,
    mediaType: 'application/pdf',
    sourcePage,
    part: null,
    target: drawn,
    layerTarget: path.join(folder, `${sourcePage}-layer.json`),
    mostMegapixels: 120,
  } satisfies DrawInput);
  await worker.run('read', { drawn, dpi: 300, target: path.join(folder, `${sourcePage}-read.jpg`), wish: {} });
}

/** The most memory that each child of this process has held. */
function childrenPeaksMb(): number[] {
  const ids = readFileSync(`/proc/self/task/${process.pid}/children`, 'utf8').trim().split(' ');
  return ids.map((id) => {
    const status = readFileSync(`/proc/${id}/status`, 'utf8');
    return Math.round(Number(/VmHWM:\s+(\d+)/.exec(status)?.[1] ?? 0) / 1024);
  });
}
