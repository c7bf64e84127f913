import type { z } from 'zod';
import { problem } from '#shared/api/common.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';
import { AppError, type ErrorCode, errorStatus } from '#shared/kit/app-error.ts';

type Schema = z.ZodType;
type Part<Name extends string, T> = unknown extends T
  ? { [K in Name]?: never }
  : undefined extends T
    ? { [K in Name]?: T }
    : { [K in Name]: T };
type QueryPart<T> = unknown extends T ? { query?: never } : { query?: T };

/** What goes with a call: as the endpoint's schemas say, and nothing else. */
export type Given<P extends Schema, Q extends Schema, B extends Schema> = Part<'params', z.input<P>> &
  QueryPart<z.input<Q>> &
  Part<'body', z.input<B>> & { signal?: AbortSignal };

type Loose = { params?: unknown; query?: unknown; body?: unknown; signal?: AbortSignal };

/** What stands in an address is always one of these. */
type Written = string | number | boolean | null | undefined;

const signedOutListeners = new Set<() => void>();

/** Tells when the server no longer knows who asks: the session ended, or the person was barred. */
export function whenSignedOut(listener: () => void): () => void {
  signedOutListeners.add(listener);
  return () => signedOutListeners.delete(listener);
}

/** The address of an endpoint, for links and pictures. */
export function addressOf<P extends Schema, Q extends Schema>(
  endpoint: Pick<Endpoint<P, Q>, 'path'>,
  given: { params?: z.input<P>; query?: z.input<Q> } = {},
): string {
  const params = (given.params ?? {}) as Record<string, Written>;
  const path = endpoint.path.replace(/:(\w+)/g, (_all, name: string) => encodeURIComponent(String(params[name] ?? '')));
  const asked = new URLSearchParams();
  for (const [name, value] of Object.entries<Written>(given.query ?? {})) {
    if (value !== undefined && value !== null && value !== '') asked.set(name, String(value));
  }
  const query = asked.toString();
  return query === '' ? path : `${path}?${query}`;
}

/** Asks one endpoint of the server. Every failure is an AppError with words that a person may read. */
export async function call<P extends Schema, Q extends Schema, B extends Schema, R extends Schema>(
  endpoint: Endpoint<P, Q, B, R>,
  given: Given<P, Q, B>,
): Promise<z.output<R>> {
  const response = await send(endpoint, given);
  if (!response.ok) throw await refusalOf(response);
  if (endpoint.replyKind === 'text') return endpoint.reply.parse(await response.text());
  const read = endpoint.reply.safeParse(await response.json());
  if (read.success) return read.data;
  throw new Error(
    'The server answered in a form that this screen does not know. Reload the page to get the newest screen.',
  );
}

async function send(endpoint: Endpoint, { params, query, body, signal }: Loose): Promise<Response> {
  const hasBody = body !== undefined;
  const address = addressOf(endpoint, { params, query });
  try {
    return await fetch(address, {
      method: endpoint.method.toUpperCase(),
      headers: { Accept: 'application/json, text/plain', ...(hasBody ? { 'Content-Type': 'application/json' } : {}) },
      ...(hasBody ? { body: JSON.stringify(body) } : {}),
      ...(signal === undefined ? {} : { signal }),
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw unreachable();
  }
}

export const unreachable = (): AppError =>
  new AppError(
    'busy',
    'The server cannot be reached. Check the connection, then try again. Nothing on this screen is lost.',
  );

const isKnown = (code: string): code is ErrorCode => code in errorStatus;

/** Turns problem details (RFC 9457) back into the error that the server meant. */
async function refusalOf(response: Response): Promise<Error> {
  const text = await response.text();
  return refusal(response.status, text);
}

export function refusal(status: number, text: string): Error {
  const read = problem.safeParse(parsed(text));
  if (!read.success) return status >= 500 ? unreachable() : new Error(`The server refused this (${status}).`);
  const { code, detail, type: _type, title: _title, status: _status, ...details } = read.data;
  if (!isKnown(code)) return new Error(detail);
  if (code === 'not-signed-in') for (const listener of signedOutListeners) listener();
  const { issues, ...more } = details;
  return new AppError(code, detail, issues === undefined ? more : { ...more, issues });
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

/** Whether asking once more may help: not where the server has understood and refused. */
export const isWorthRetrying = (error: unknown): boolean => error instanceof AppError && error.code === 'busy';
