import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { readConfig } from '#server/config/config.ts';
import { seedWhenNew } from '#server/demo/seed.ts';
import { type WorkerScript, startServer } from './start.ts';

const slowestStopMs = 10_000;

/** Beside the built server lies the built worker; in development both run from source. */
function workerScript(): WorkerScript {
  const here = path.dirname(fileURLToPath(import.meta.url));
  const built = path.join(here, 'worker.js');
  const heap = '--max-old-space-size=700';
  if (existsSync(built)) return { script: built, execArgv: [heap] };
  return { script: path.join(here, 'worker.ts'), execArgv: [heap, '--import', 'tsx'] };
}

async function run(): Promise<void> {
  const config = readConfig(process.env);
  const running = await startServer(config, workerScript());
  const address = config.publicUrl ?? running.url;
  const demo = await seedWhenNew(running);
  console.log(`Benchleaf is ready at ${running.url}`);
  if (address !== running.url) console.log(`Its public address is ${address}`);
  for (const line of demo) console.log(line);

  const stop = (): void => {
    setTimeout(() => process.exit(1), slowestStopMs).unref();
    running.stop().then(
      () => process.exit(0),
      (error: unknown) => {
        console.error(error);
        process.exit(1);
      },
    );
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
  process.on('uncaughtException', (error) => {
    running.tools.log.fatal({ err: error }, 'unexpected; stopping');
    stop();
  });
}

run().catch((error: unknown) => {
  const { code, message, port } = error as { code?: string; message?: string; port?: number };
  console.error(
    code === 'EADDRINUSE' ? `Port ${port} is taken. Set PORT to another one, or to 0 for any.` : (message ?? error),
  );
  process.exit(1);
});
