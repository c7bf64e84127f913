import { WorkerProcess } from './worker-pool.ts';

/**
 * A process of its own for short work that somebody waits for: examining a file as it arrives, reading one zone again.
 * One thing after the other; no file can take the server down, and the queue of pages is not held up.
 */
export type SideWorker = { run: (task: string, input: unknown) => Promise<unknown>; stop: () => void };

const idleMs = 30_000;

export function createSideWorker(worker: ConstructorParameters<typeof WorkerProcess>[0]): SideWorker {
  const process = new WorkerProcess(worker);
  let last: Promise<unknown> = Promise.resolve();
  let idle: NodeJS.Timeout | undefined;
  return {
    run(task, input) {
      const turn = last.then(async () => {
        clearTimeout(idle);
        try {
          return await process.run(task, input);
        } finally {
          idle = setTimeout(() => process.stop(), idleMs).unref();
        }
      });
      last = turn.catch(() => undefined);
      return turn;
    },
    stop() {
      clearTimeout(idle);
      process.stop();
    },
  };
}
