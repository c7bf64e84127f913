import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { projectRoot } from '#server/db/database.ts';
import type { DrawInput } from '#server/features/pages/draw.ts';
import { WorkerProcess } from '#server/jobs/worker-pool.ts';
import { cpuOf, machineCpu } from './spent.ts';

const pages = Array.from({ length: 10 }, (_, index) => index);
/** No limit: it is the need that is measured. */
const limits = { memoryBytes: 8e9, timeoutMs: 600_000 };

type Spent = { seconds: number; cpuSeconds: number; otherCores: number };
type Run = { fromStart: Spent; steady: Spent; peakMb: number };

/**
 * Draws and reads ten pages of a demo manual in one worker process and then in two, as the server does: what one needs
 * of memory at its peak, and how many more pages two read in the same time. First from the start, all workers taking
 * from one queue until it is empty; then warm, each going through all the pages. The two differ by what starting costs
 * and by the last page, at which one worker is alone. Neither says anything while other work holds the cores, so its
 * share is told. `two=no` leaves the second part out.
 */
export async function benchWorkers(args: readonly string[] = []): Promise<string[]> {
  if (process.platform !== 'linux') return ['left out: memory is read from /proc'];
  execFileSync(process.execPath, ['server/scripts/build.mjs'], { cwd: projectRoot });
  const folder = mkdtempSync(path.join(os.tmpdir(), 'benchleaf-workers-'));
  const one = await readWith(1, folder);
  const two = args.includes('two=no') ? null : await readWith(2, folder);
  rmSync(folder, { recursive: true });
  return [
    `one worker, from its start: ${line(one.fromStart, 1)}, at most ${one.peakMb} MB resident`,
    `one worker, warm: ${line(one.steady, 1)}`,
    ...(two === null
      ? []
      : [
          `two, from their start: ${line(two.fromStart, 1)}; two to one: ${(one.fromStart.seconds / two.fromStart.seconds).toFixed(2)}`,
          `two, warm: ${line(two.steady, 2)}; two to one: ${((2 * one.steady.seconds) / two.steady.seconds).toFixed(2)}`,
        ]),
  ];
}

function line({ seconds, cpuSeconds, otherCores }: Spent, rounds: number): string {
  const count = pages.length * rounds;
  const perMinute = `${((count / seconds) * 60).toFixed(1)} pages a minute`;
  return `${perMinute}, ${(cpuSeconds / count).toFixed(2)} s of processor time a page (other work held ${otherCores.toFixed(1)} cores)`;
}

async function readWith(count: number, folder: string): Promise<Run> {
  const script = path.join(projectRoot, 'dist/server/worker.js');
  const workers = Array.from({ length: count }, () => new WorkerProcess({ script, execArgv: [], ...limits }));
  const waiting = [...pages];
  const fromStart = await measured(() =>
    Promise.all(
      workers.map(async (worker) => {
        for (let page = waiting.shift(); page !== undefined; page = waiting.shift())
          await readOne(worker, page, path.join(folder, String(page)));
      }),
    ),
  );
  const steady = await measured(() =>
    Promise.all(
      workers.map(async (worker, at) => {
        // Not the same page at the same time: they take differently long, and differently much memory.
        const from = (at * pages.length) / count;
        for (const page of [...pages.slice(from), ...pages.slice(0, from)])
          await readOne(worker, page, path.join(folder, `${at}-${page}`));
      }),
    ),
  );
  const peakMb = Math.max(...children().map(peakOfMb));
  for (const worker of workers) worker.stop();
  return { fromStart, steady, peakMb };
}

/** How long some work of the child processes takes, and what other work the machine does meanwhile. */
async function measured(work: () => Promise<unknown>): Promise<Spent> {
  const spent = (): { ours: number; all: number; at: number } => {
    const ours = [process.pid, ...children()].reduce((sum, id) => sum + cpuOf(id), 0);
    return { ours, all: machineCpu(), at: performance.now() };
  };
  const from = spent();
  await work();
  const to = spent();
  const seconds = (to.at - from.at) / 1000;
  const cpuSeconds = to.ours - from.ours;
  return { seconds, cpuSeconds, otherCores: Math.max(0, to.all - from.all - cpuSeconds) / seconds };
}

async function readOne(worker: WorkerProcess, sourcePage: number, target: string): Promise<void> {
  const source = path.join(projectRoot, 'server/demo/manuals/hb-12.pdf');
  const drawn = `${target}.jpg`;
  await worker.run('draw', {
    path: source,
    mediaType: 'application/pdf',
    sourcePage,
    part: null,
    target: drawn,
    layerTarget: `${target}-layer.json`,
    mostMegapixels: 120,
  } satisfies DrawInput);
  await worker.run('read', { drawn, dpi: 300, target: `${target}-read.jpg`, wish: {} });
}

const children = (): number[] =>
  readFileSync(`/proc/self/task/${process.pid}/children`, 'utf8')
    .split(' ')
    .filter((id) => id !== '')
    .map(Number);

/** The most memory that a process has held. */
function peakOfMb(id: number): number {
  const status = readFileSync(`/proc/${id}/status`, 'utf8');
  return Math.round(Number(/VmHWM:\s+(\d+)/.exec(status)?.[1] ?? 0) / 1024);
}
