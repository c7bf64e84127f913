import sharp from 'sharp';
import { type InspectInput, inspect } from '#server/features/pages/inspect.ts';
import { type DrawInput, drawPage } from '#server/features/pages/draw.ts';
import type { WorkerReply, WorkerRequest } from '#server/jobs/worker-pool.ts';
import type { PrintedNumber } from '#shared/relations/printed-number.ts';
import type { ReadInput } from '#server/features/recognition/read.ts';
import type { ReadZoneInput } from '#server/features/recognition/read-zone.ts';

/**
 * The worker process: examines files, draws pages and reads them, one at a time. It holds no database and may be killed
 * at any moment. The reading engine is loaded only when there is something to read.
 */
const tasks: Record<string, (input: never) => Promise<unknown>> = {
  inspect: (input: InspectInput) => inspect(input),
  draw: (input: DrawInput) => drawPage(input),
  'read-zone': async (input: ReadZoneInput) =>
    (await import('#server/features/recognition/read-zone.ts')).readZone(input),
  'propose-relations': async (numbers: PrintedNumber[]) =>
    (await import('#shared/relations/propose.ts')).proposeRelations(numbers),
  read: async (input: ReadInput) => (await import('#server/features/recognition/read.ts')).readPage(input),
};

async function answer({ id, task, input }: WorkerRequest): Promise<WorkerReply> {
  try {
    const run = tasks[task];
    if (run === undefined) throw new Error(`There is no task called ${task}.`);
    return { id, ok: true, value: await run(input as never) };
  } catch (error) {
    const hopeless = error instanceof Error && error.name === 'HopelessPage';
    const problem = error instanceof Error ? error.message : String(error);
    return { id, ok: false, hopeless, problem };
  }
}

// Each page is another picture: nothing that the library keeps would be asked for again.
sharp.cache(false);
// One page at a time in each of several processes: more threads in one only take turns, and each holds memory.
sharp.concurrency(1);

process.on('message', (request: WorkerRequest) => {
  void answer(request).then((reply) => {
    process.send?.(reply);
    // Pictures lie outside the script's own heap, so their garbage presses too little to be collected by itself.
    globalThis.gc?.();
  });
});
process.on('disconnect', () => process.exit(0));
// Libraries throw inside callbacks on bad files; the job is then failed by its time limit or by this exit.
process.on('uncaughtException', () => process.exit(1));
