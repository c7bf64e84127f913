/** Every failure that a person may see has a code here. The server turns codes into status, the client into words. */
export const errorStatus = {
  'invalid-input': 400,
  'not-signed-in': 401,
  'role-too-low': 403,
  'not-found': 404,
  'revision-conflict': 409,
  'already-exists': 409,
  'wrong-state': 409,
  'too-large': 413,
  'wrong-kind': 415,
  'cannot-do': 422,
  'too-many-requests': 429,
  busy: 503,
} as const;
export type ErrorCode = keyof typeof errorStatus;

/** A short title for each code, the `title` of the problem details (RFC 9457). */
export const errorTitle: Record<ErrorCode, string> = {
  'invalid-input': 'The request is not as described',
  'not-signed-in': 'Not signed in',
  'role-too-low': 'Your role does not allow this',
  'not-found': 'Not found',
  'revision-conflict': 'Someone else changed it first',
  'already-exists': 'It exists already',
  'wrong-state': 'Not possible in its present state',
  'too-large': 'Too large',
  'wrong-kind': 'Wrong kind of file',
  'cannot-do': 'Understood, but cannot be done',
  'too-many-requests': 'Too many requests',
  busy: 'Busy, try again shortly',
};

export type Issue = { path: string; message: string };

export class AppError extends Error {
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly details?: { issues?: Issue[] } & Record<string, unknown>,
  ) {
    super(message);
    this.name = 'AppError';
  }
}
