import type { Request } from 'express';
import type { Role } from '#shared/access/roles.ts';

export type SignedIn = { id: string; name: string; email: string; role: Role };

/** Who sent the request; null when nobody is signed in. */
export type FindSession = (request: Request) => Promise<SignedIn | null>;
