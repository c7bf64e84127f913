import { type ChildProcess, fork } from 'node:child_process';
import { readFile } from 'node:fs/promises';

/** What a worker process is asked and what it answers. `hopeless`: trying again would give the same. */
export type WorkerRequest = { id: number; task: string; input: unknown };
export type WorkerReply = { id: number } & (
  { ok: true; value: unknown } | { ok: false; problem: string; hopeless: boolean }
);

/** `passing`: another try may succeed. `hopeless`: it would fail alike. `stopped`: the server is going down, nobody is to blame. */
export type FailureKind = 'passing' | 'hopeless' | 'stopped';

export class WorkerFailure extends Error {
  constructor(
    message: string,
    readonly kind: FailureKind,
  ) {
    super(message);
    this.name = 'WorkerFailure';
  }
}

type Options = { script: string; execArgv: string[]; memoryBytes: number; timeoutMs: number };
type Waiting = { resolve: (value: unknown) => void; reject: (error: WorkerFailure) => void; timer: NodeJS.Timeout };

const memoryLookEveryMs = 250;
/** A worker that has grown past this share of its limit after a job is replaced: WebAssembly memory never shrinks. */
const replaceAtShare = 0.75;

/** glibc keeps freed memory in an arena for each thread; with two of them a worker stays a quarter smaller (measured). */
const fewArenas = { MALLOC_ARENA_MAX: '2' };

/** One worker process: does one task at a time, is killed when it runs too long or grows too big, and is then made anew. */
export class WorkerProcess {
  private child: ChildProcess | null = null;
  private waiting: Waiting | null = null;
  private nextId = 1;
  private watch: NodeJS.Timeout | null = null;

  constructor(private readonly options: Options) {}

  run(task: string, input: unknown): Promise<unknown> {
    if (this.waiting !== null) return Promise.reject(new WorkerFailure('The worker is busy.', 'passing'));
    const child = this.child ?? this.start();
    const id = this.nextId++;
    return new Promise((resolve, reject) => {
      const seconds = Math.round(this.options.timeoutMs / 1000);
      const timer = setTimeout(
        () => this.kill(`It took longer than ${seconds} seconds and was stopped.`, 'passing'),
        this.options.timeoutMs,
      );
      this.waiting = { resolve, reject, timer };
      child.send({ id, task, input } satisfies WorkerRequest, (error) => {
        if (error !== null) this.kill('The worker process could not be reached.', 'passing');
      });
    });
  }

  /** Stops the process. A task under way is rejected, without blame. */
  stop(): void {
    this.kill('The server is stopping.', 'stopped');
  }

  private start(): ChildProcess {
    const { script, execArgv } = this.options;
    const child = fork(script, [], {
      execArgv: [...execArgv, '--expose-gc'],
      env: { ...process.env, ...fewArenas },
      serialization: 'advanced',
      stdio: ['ignore', 'ignore', 'ignore', 'ipc'],
    });
    this.child = child;
    child.on('message', (message) => void this.receive(child, message as WorkerReply));
    child.on('error', () => this.lose(child, 'The worker process could not be started.'));
    child.on('exit', () => this.lose(child, 'The worker process ended unexpectedly.'));
    this.watch = setInterval(() => void this.lookAtMemory(child), memoryLookEveryMs);
    this.watch.unref();
    return child;
  }

  private async receive(child: ChildProcess, reply: WorkerReply): Promise<void> {
    const { waiting } = this;
    if (child !== this.child || waiting === null) return;
    const bytes = await residentBytes(child.pid);
    if (this.waiting !== waiting) return;
    clearTimeout(waiting.timer);
    this.waiting = null;
    if (bytes > this.options.memoryBytes * replaceAtShare) this.discard();
    if (reply.ok) waiting.resolve(reply.value);
    else waiting.reject(new WorkerFailure(reply.problem, reply.hopeless ? 'hopeless' : 'passing'));
  }

  private lose(child: ChildProcess, problem: string): void {
    if (child === this.child) this.kill(problem, 'passing');
  }

  private async lookAtMemory(child: ChildProcess): Promise<void> {
    const bytes = await residentBytes(child.pid);
    if (child === this.child && bytes > this.options.memoryBytes) {
      this.kill('It needed more memory than is allowed and was stopped.', 'passing');
    }
  }

  private kill(problem: string, kind: FailureKind): void {
    const { waiting } = this;
    this.waiting = null;
    this.discard();
    if (waiting === null) return;
    clearTimeout(waiting.timer);
    waiting.reject(new WorkerFailure(problem, kind));
  }

  private discard(): void {
    const { child } = this;
    this.child = null;
    if (this.watch !== null) clearInterval(this.watch);
    this.watch = null;
    child?.kill('SIGKILL');
  }
}

/** Resident memory of a process by the kernel's own account; 0 where there is no /proc, and then no limit holds. */
async function residentBytes(pid: number | undefined): Promise<number> {
  if (pid === undefined) return 0;
  const pageBytes = 4096;
  const statm = await readFile(`/proc/${pid}/statm`, 'utf8').catch(() => '');
  return Number(statm.split(' ')[1] ?? 0) * pageBytes;
}
