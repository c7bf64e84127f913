import { rm } from 'node:fs/promises';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import { pino } from 'pino';
import { type Config } from '#server/config/config.ts';
import { readOrCreateSecret } from '#server/config/secret.ts';
import { openDatabase, projectRoot } from '#server/db/database.ts';
import { createAuth, createMailer } from '#server/features/accounts/index.ts';
import { coeditingSocket, createSharedPages } from '#server/features/coediting/index.ts';
import { addPagesBy, drawStep } from '#server/features/pages/index.ts';
import { readStep } from '#server/features/recognition/index.ts';
import { learnStep, structureStep, teachStep } from '#server/features/revisions/index.ts';
import { indexStep } from '#server/features/search/index.ts';
import type { Tools } from '#server/http/tools.ts';
import { createSideWorker } from '#server/jobs/side-worker.ts';
import { createLiveEvents } from '#server/jobs/live-events.ts';
import { announceBy } from '#server/jobs/queue.ts';
import { type Steps, createRunner } from '#server/jobs/runner.ts';
import { folderStore } from '#server/storage/folder-store.ts';
import { s3Store } from '#server/storage/s3-store.ts';
import { type AppTools, createApp } from './app.ts';
import { pipeline } from './pipeline.ts';

export type Running = { url: string; tools: AppTools; stop: () => Promise<void> };

/** How the worker process is started: its script and the flags for the runtime, which differ between source and build. */
export type WorkerScript = { script: string; execArgv: string[] };

const slowestStopMs = 8000;
/** Examining a file or reading a zone needs little; a file that makes it need more is not a scan. */
const sideWorkerMemoryBytes = 600 * 1024 * 1024;
const sideWorkerTimeoutMs = 30_000;

/** Opens the database, starts the queue and listens. Everything that runs hangs on what this returns. */
export async function startServer(config: Config, worker: WorkerScript): Promise<Running> {
  const log = pino({ level: config.logLevel });
  const { db, raw, close } = openDatabase(config.dataDir);
  await rm(path.join(config.dataDir, 'incoming'), { recursive: true, force: true });
  const server = http.createServer((_request, response) => response.writeHead(503).end());
  const { url, trustedOrigins } = await listen(server, config);

  const announce = announceBy(pipeline);
  const live = createLiveEvents();
  const now = (): Date => new Date();
  const files =
    config.s3 === null
      ? folderStore(path.join(config.dataDir, 'files'))
      : s3Store(config.s3, path.join(config.dataDir, 'cache'));
  const tools: Tools = { config, db, raw, files, announce, live, log, now, wake: () => runner.wake() };
  const limits = { memoryBytes: config.limits.workerMemoryBytes, timeoutMs: config.limits.pageTimeoutMs };
  const runner = createRunner({
    db,
    steps: stepsOf(tools),
    workers: config.recognitionWorkers,
    worker: { ...worker, ...limits },
    live,
    log,
    now,
  });
  const sideWorker = createSideWorker({
    ...worker,
    memoryBytes: sideWorkerMemoryBytes,
    timeoutMs: sideWorkerTimeoutMs,
  });

  const mail = { sendMail: createMailer(tools), publicUrl: config.publicUrl ?? url };
  const auth = createAuth(tools, { secret: readOrCreateSecret(config.dataDir), trustedOrigins, ...mail });
  const clientDir = path.join(projectRoot, 'dist/client');
  const sharedPages = createSharedPages(tools);
  const { presence } = sharedPages;
  const addPages = addPagesBy(announce);
  const appTools: AppTools = { ...tools, ...mail, auth, sideWorker, addPages, presence, trustedOrigins, clientDir };
  const { app, api } = createApp(appTools);
  const socket = coeditingSocket(sharedPages, { findSession: api.findSession, trustedOrigins });
  server.removeAllListeners('request');
  server.on('request', app);
  server.on('upgrade', (...arrival) => void socket.upgrade(...arrival));
  runner.start();

  const stop = async (): Promise<void> => {
    sideWorker.stop();
    sharedPages.stop();
    socket.stop();
    const closed = new Promise((resolve) => server.close(resolve));
    await runner.stop();
    server.closeIdleConnections();
    await Promise.race([closed, new Promise((resolve) => setTimeout(resolve, slowestStopMs / 4).unref())]);
    server.closeAllConnections();
    close();
  };
  return { url, tools: appTools, stop };
}

const stepsOf = (tools: Tools): Steps => ({
  'draw-page': drawStep(tools),
  'read-page': readStep(tools),
  'structure-page': structureStep(tools),
  'index-page': indexStep(tools),
  'learn-page': learnStep(tools),
  'teach-manual': teachStep(tools),
});

/** Listens, and says under which addresses its own pages are opened: the one configured, this machine's, and the development server's. */
async function listen(server: http.Server, config: Config): Promise<{ url: string; trustedOrigins: string[] }> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.port, config.host, () => resolve());
  });
  const { port } = server.address() as AddressInfo;
  const own = ['127.0.0.1', 'localhost'].map((host) => `http://${host}:${port}`);
  const development = config.production ? [] : ['http://127.0.0.1:5173', 'http://localhost:5173'];
  const configured = config.publicUrl === null ? [] : [new URL(config.publicUrl).origin];
  return { url: `http://127.0.0.1:${port}`, trustedOrigins: [...configured, ...own, ...development] };
}
