import { z } from 'zod';
import type { Action } from '#shared/access/roles.ts';

/** What comes back besides JSON: a file, a page of text, or a stream of events. */
export type ReplyKind = 'json' | 'text' | 'file' | 'events';

export type Endpoint<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  R extends z.ZodType = z.ZodType,
> = {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  summary: string;
  /** Null: open to everybody, signed in or not. */
  action: Action | null;
  params: P;
  query: Q;
  body: B;
  reply: R;
  status: number;
  replyKind: ReplyKind;
  /** The body is multipart form data with files in this field, instead of JSON. */
  filesField?: string;
};

type Given<P, Q, B, R> = {
  method: Endpoint['method'];
  path: string;
  summary: string;
  action: Action | null;
  params?: P;
  query?: Q;
  body?: B;
  reply: R;
  status?: number;
  replyKind?: ReplyKind;
  filesField?: string;
};

const nothing = z.unknown();
type Nothing = typeof nothing;

/** Describes one route once: the server's edge, the client's call and the OpenAPI document all read it. */
export const defineEndpoint = <
  R extends z.ZodType,
  P extends z.ZodType = Nothing,
  Q extends z.ZodType = Nothing,
  B extends z.ZodType = Nothing,
>(
  given: Given<P, Q, B, R>,
): Endpoint<P, Q, B, R> => ({
  ...given,
  params: given.params ?? (nothing as unknown as P),
  query: given.query ?? (nothing as unknown as Q),
  body: given.body ?? (nothing as unknown as B),
  status: given.status ?? 200,
  replyKind: given.replyKind ?? 'json',
});
