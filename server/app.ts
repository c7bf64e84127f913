import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { toNodeHandler } from 'better-auth/node';
import express, { type Express, type RequestHandler, Router } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { getHealth } from '#shared/api/health.ts';
import { AppError } from '#shared/kit/app-error.ts';
import {
  type Auth,
  type SendMail,
  accountRoutes,
  hasDemoPeople,
  sessionFinder,
} from '#server/features/accounts/index.ts';
import { type Presence, coeditingRoutes } from '#server/features/coediting/index.ts';
import { commentRoutes } from '#server/features/comments/index.ts';
import { editionRoutes } from '#server/features/editions/index.ts';
import { type AddPages, manualRoutes } from '#server/features/manuals/index.ts';
import { pageRoutes } from '#server/features/pages/index.ts';
import { recognitionRoutes } from '#server/features/recognition/index.ts';
import { revisionRoutes } from '#server/features/revisions/index.ts';
import { searchRoutes } from '#server/features/search/index.ts';
import { valueRoutes } from '#server/features/values/index.ts';
import { problemHandler, unknownRoute } from '#server/http/errors.ts';
import { liveRoute } from '#server/http/live-route.ts';
import { openApiDocument } from '#server/http/openapi.ts';
import { type ApiRouter, serve } from '#server/http/serve.ts';
import type { Tools } from '#server/http/tools.ts';
import type { SideWorker } from '#server/jobs/side-worker.ts';
import { queueCounts } from '#server/jobs/queue.ts';

export type AppTools = Tools & {
  auth: Auth;
  sideWorker: SideWorker;
  addPages: AddPages;
  presence: Presence;
  sendMail: SendMail;
  /** The address that people open; links in mails begin with it. */
  publicUrl: string;
  trustedOrigins: string[];
  clientDir: string;
};

export const version = '0.1.0';
const largestBody = '24mb';

/** Builds the Express app from its tools. It listens to nothing, so that a test can hold it. */
export function createApp(tools: AppTools): { app: Express; api: ApiRouter } {
  const app = express();
  if (tools.config.trustProxy) app.set('trust proxy', 1);
  app.disable('x-powered-by');
  app.use(
    pinoHttp({
      logger: tools.log,
      autoLogging: false,
      redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'],
    }),
  );
  app.use(secureHeaders());
  app.use('/api', sameOrigin(tools.trustedOrigins));
  app.use('/api/auth', signInOnly);
  app.all('/api/auth/*splat', toNodeHandler(tools.auth));
  app.use(express.json({ limit: largestBody }));
  const api = apiRoutes(tools);
  app.use(api.router);
  app.use('/api', unknownRoute);
  serveClient(app, tools);
  app.use(problemHandler);
  return { app, api };
}

function apiRoutes(tools: AppTools): ApiRouter {
  const api: ApiRouter = { router: Router(), findSession: sessionFinder(tools.auth), served: [] };
  serve(api, getHealth, () => ({ status: 'ok' as const, version, queue: queueCounts(tools.db) }));
  accountRoutes(api, tools);
  manualRoutes(api, tools);
  pageRoutes(api, tools);
  recognitionRoutes(api, tools);
  revisionRoutes(api, tools);
  coeditingRoutes(api, tools);
  commentRoutes(api, tools);
  valueRoutes(api, tools);
  editionRoutes(api, tools);
  searchRoutes(api, tools);
  liveRoute(api, tools);
  api.router.get('/api/openapi.json', (_request, response) => {
    response.json(openApiDocument(api.served, version));
  });
  return api;
}

/** The rest of the sign-in library's administration stays inside: people are managed through our own, audited routes. */
const signInOnly: RequestHandler = (request, _response, next) => {
  if (request.path.startsWith('/admin')) throw new AppError('not-found', 'There is nothing at this address.');
  // Counted against the caller's own address, which the library does not read from the socket.
  request.headers['x-client-ip'] = request.ip ?? 'unknown';
  next();
};

/** Browsers say where a request comes from; one that changes something must come from our own pages. */
const sameOrigin =
  (trustedOrigins: string[]): RequestHandler =>
  (request, _response, next) => {
    const { origin } = request.headers;
    const isOwn =
      origin === undefined ||
      trustedOrigins.includes(origin) ||
      origin === `${request.protocol}://${request.headers.host}`;
    if (request.method !== 'GET' && request.method !== 'HEAD' && !isOwn) {
      throw new AppError('role-too-low', 'This request comes from another site.');
    }
    next();
  };

const secureHeaders = (): RequestHandler =>
  helmet({
    hsts: false,
    contentSecurityPolicy: {
      directives: {
        'upgrade-insecure-requests': null,
        'connect-src': ["'self'", 'ws:', 'wss:'],
        'img-src': ["'self'", 'data:', 'blob:'],
        'style-src': ["'self'", "'unsafe-inline'"],
        'worker-src': ["'self'", 'blob:'],
      },
    },
  });

/** Tells the sign-in screen that the demo's accounts can be offered. */
const demoMark = '<meta name="benchleaf-demo" content="yes">';
const notBuilt = '<!doctype html><title>Benchleaf</title><p>The client has not been built: npm run build.';

/** The built client. A missing piece of it is a 404, not the start page; every other address is a screen. */
function serveClient(app: Express, { clientDir, db }: AppTools): void {
  app.use(
    '/assets',
    express.static(path.join(clientDir, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }),
  );
  app.use(express.static(clientDir, { index: false }));
  app.get(['/', '/*splat'], async (_request, response) => {
    const page = await readFile(path.join(clientDir, 'index.html'), 'utf8').catch(() => notBuilt);
    response
      .set('Cache-Control', 'no-cache')
      .type('html')
      .send(hasDemoPeople(db) ? page.replace('</head>', `${demoMark}</head>`) : page);
  });
}
