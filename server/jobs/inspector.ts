import { WorkerProcess } from './worker-pool.ts';

/** Examines files as they arrive, one after the other, in a process of its own so that no file can take the server down. */
export type Inspector = { inspect: (input: unknown) => Promise<unknown>; stop: () => void };

const idleMs = 30_000;

export function createInspector(worker: ConstructorParameters<typeof WorkerProcess>[0]): Inspector {
  const process = new WorkerProcess(worker);
  let last: Promise<unknown> = Promise.resolve();
  let idle: NodeJS.Timeout | undefined;
  return {
    inspect(input) {
      const turn = last.then(async () => {
        clearTimeout(idle);
        try {
          return await process.run('inspect', input);
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
