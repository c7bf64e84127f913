import type { Request, Response, Router } from 'express';
import type { z } from 'zod';
import { can, lowestRole } from '#shared/access/roles.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';
import { AppError } from '#shared/kit/app-error.ts';
import type { FindSession, SignedIn } from './session.ts';

type Schema = z.ZodType;

/** What a handler is given: checked input, and who asks. */
export type Call<P, Q, B> = { params: P; query: Q; body: B; user: SignedIn; request: Request; response: Response };

/** A router that only takes endpoints described in `shared/api`, so that none is left unguarded or undescribed. */
export type ApiRouter = { router: Router; findSession: FindSession; served: Endpoint[] };

const nobody: SignedIn = { id: '', name: '', email: '', role: 'reader', sessionId: '' };

async function guard(api: ApiRouter, endpoint: Endpoint, request: Request): Promise<SignedIn> {
  if (endpoint.action === null) return nobody;
  const user = await api.findSession(request);
  if (user === null) throw new AppError('not-signed-in', 'Sign in first.');
  if (!can(user.role, endpoint.action)) {
    const needed = lowestRole[endpoint.action];
    throw new AppError('role-too-low', `This needs the role ${needed} or above; you are signed in as ${user.role}.`);
  }
  return user;
}

/** Connects one endpoint to its handler: role, then input, then the handler, then the reply. */
export function serve<P extends Schema, Q extends Schema, B extends Schema, R extends Schema>(
  api: ApiRouter,
  endpoint: Endpoint<P, Q, B, R>,
  handle: (call: Call<z.output<P>, z.output<Q>, z.output<B>>) => Promise<z.input<R>> | z.input<R>,
): void {
  serveRaw(api, endpoint, async (call) => {
    const reply = await handle(call);
    call.response.status(endpoint.status).json(endpoint.reply.parse(reply));
  });
}

/** The same for endpoints that answer with a file, a stream or plain text: the handler writes the response itself. */
export function serveRaw<P extends Schema, Q extends Schema, B extends Schema, R extends Schema>(
  api: ApiRouter,
  endpoint: Endpoint<P, Q, B, R>,
  handle: (call: Call<z.output<P>, z.output<Q>, z.output<B>>) => Promise<void> | void,
): void {
  api.served.push(endpoint);
  api.router[endpoint.method](endpoint.path, async (request: Request, response: Response) => {
    const user = await guard(api, endpoint, request);
    await handle({
      params: endpoint.params.parse(request.params),
      query: endpoint.query.parse(request.query),
      body: endpoint.body.parse(request.body),
      user,
      request,
      response,
    });
  });
}
