import type { Logger } from 'pino';
import type { Database } from '#server/db/database.ts';
import type { StepName } from './events.ts';
import type { LiveEvents } from './live-events.ts';
import { type Job, claim, finish, giveBack, queueCounts, requeueInterrupted, stillMine } from './queue.ts';
import { WorkerFailure, WorkerProcess } from './worker-pool.ts';

/** A step done in the server's own process: short, and repeatable. */
export type LightStep = { heavy: false; run: (job: Job) => void };

/**
 * A step done in a worker process. `prepare` says what the worker is asked (null: there is nothing left to do);
 * `land` stores the answer, in the same transaction that ends the job; `after` runs once that is committed.
 */
export type HeavyStep = {
  heavy: true;
  task: string;
  prepare: (job: Job) => Promise<unknown>;
  keep: (job: Job, answer: unknown) => Promise<unknown>;
  land: (connection: Database, job: Job, kept: unknown) => void;
  began: (job: Job) => void;
  failed: (connection: Database, job: Job, problem: string) => void;
  settled: (job: Job) => void;
};
export type Steps = Record<StepName, LightStep | HeavyStep>;

type Options = {
  db: Database;
  steps: Steps;
  workers: number;
  worker: ConstructorParameters<typeof WorkerProcess>[0];
  live: LiveEvents;
  log: Logger;
  now: () => Date;
};

const idleLookEveryMs = 500;

export type Runner = { start: () => void; wake: () => void; stop: () => Promise<void> };

/** Works off the queue: one loop a worker process for heavy steps, and one for light steps between them. */
export function createRunner(options: Options): Runner {
  const { db, steps, live } = options;
  const namesOf = (heavy: boolean): StepName[] =>
    (Object.keys(steps) as StepName[]).filter((name) => steps[name].heavy === heavy);
  const [heavyNames, lightNames] = [namesOf(true), namesOf(false)];
  const processes = Array.from({ length: options.workers }, () => new WorkerProcess(options.worker));
  const busy = new Set<WorkerProcess>();
  let timer: NodeJS.Timeout | null = null;
  let isStopping = false;
  const tasks = new Set<Promise<void>>();

  const drainLight = (): void => {
    for (
      let job = claim(db, lightNames, options.now().getTime());
      job;
      job = claim(db, lightNames, options.now().getTime())
    ) {
      runLight(options, job);
    }
  };

  const wake = (): void => {
    if (isStopping) return;
    drainLight();
    for (const process of processes) {
      if (busy.has(process)) continue;
      const job = claim(db, heavyNames, options.now().getTime());
      if (job === undefined) break;
      busy.add(process);
      const task = runHeavy(options, process, job).finally(() => {
        busy.delete(process);
        tasks.delete(task);
        if (isStopping) return;
        // What follows a finished page is done before its screens are told, so that they never see it half way.
        drainLight();
        settle(steps, job);
        live.emit({ type: 'queue', ...queueCounts(db) });
        setImmediate(wake);
      });
      tasks.add(task);
    }
  };

  return {
    wake,
    start() {
      requeueInterrupted(db);
      timer = setInterval(wake, idleLookEveryMs);
      wake();
    },
    async stop() {
      isStopping = true;
      if (timer !== null) clearInterval(timer);
      for (const process of processes) process.stop();
      await Promise.all(tasks);
      requeueInterrupted(db);
    },
  };
}

function runLight({ db, steps, log, now }: Options, job: Job): void {
  const step = steps[job.step];
  if (step.heavy) return;
  try {
    db.transaction((tx) => {
      step.run(job);
      finish(tx, job);
    });
  } catch (error) {
    log.error({ error, job }, 'a step failed');
    giveBack(db, job, { problem: String(error), hopeless: false, nowMs: now().getTime() });
  }
}

/** Never rejects: whatever goes wrong is written beside the job, so that one page never stops the others. */
async function runHeavy(options: Options, process: WorkerProcess, job: Job): Promise<void> {
  const { db, steps, log } = options;
  const step = steps[job.step];
  if (!step.heavy) return;
  try {
    step.began(job);
    const input = await step.prepare(job);
    if (input === null) return finish(db, job);
    const answer = await process.run(step.task, input);
    const kept = await step.keep(job, answer);
    db.transaction((tx) => {
      // Cancelled or asked for anew while the worker was at it: the answer is let go, and nothing is written twice.
      if (!stillMine(tx, job)) return;
      step.land(tx, job, kept);
      finish(tx, job);
    });
  } catch (error) {
    landFailure(options, step, { job, error });
    if (!(error instanceof WorkerFailure)) log.error({ error, job }, 'a step failed');
  }
}

function settle(steps: Steps, job: Job): void {
  const step = steps[job.step];
  if (step.heavy) step.settled(job);
}

function landFailure({ db, now }: Options, step: HeavyStep, { job, error }: { job: Job; error: unknown }): void {
  const problem = error instanceof WorkerFailure ? error.message : 'Something unexpected went wrong; it is in the log.';
  const kind = error instanceof WorkerFailure ? error.kind : 'passing';
  if (kind === 'stopped') return;
  db.transaction((tx) => {
    if (!stillMine(tx, job)) return;
    const outcome = giveBack(tx, job, { problem, hopeless: kind === 'hopeless', nowMs: now().getTime() });
    if (outcome === 'failed') step.failed(tx, job, problem);
  });
}
