import type { IncomingMessage } from 'node:http';
import type { Role } from '#shared/access/roles.ts';

export type SignedIn = { id: string; name: string; email: string; role: Role; sessionId: string };

/** Who sent the request; null when nobody is signed in. */
export type FindSession = (request: Pick<IncomingMessage, 'headers'>) => Promise<SignedIn | null>;
