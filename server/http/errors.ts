import type { ErrorRequestHandler, RequestHandler } from 'express';
import multer from 'multer';
import { ZodError } from 'zod';
import type { Problem } from '#shared/api/common.ts';
import { AppError, type Issue, errorStatus, errorTitle } from '#shared/kit/app-error.ts';

type Logged = { id?: string | number; log?: { error: (details: object, message: string) => void } };

// Express knows an error handler by its four parameters.
/** Every failure leaves here as problem details (RFC 9457). Unexpected ones are logged and answered without inner words. */
// eslint-disable-next-line max-params -- see above
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const { id, log } = request as unknown as Logged;
  const problem = problemOf(error, String(id ?? ''));
  if (problem.status >= 500) log?.error({ err: error }, 'request failed');
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
};

export const unknownRoute: RequestHandler = () => {
  throw new AppError('not-found', 'There is nothing at this address.');
};

function problemOf(error: unknown, requestId: string): Problem {
  const known = knownError(error);
  if (known === null) {
    const detail = 'Something went wrong in the server. Nothing you sent was lost on purpose; try again.';
    return { type: 'about:blank', title: 'Internal error', status: 500, code: 'internal', detail, requestId };
  }
  const { code, message, details } = known;
  const title = errorTitle[code];
  return {
    ...details,
    type: `urn:benchleaf:problem:${code}`,
    title,
    status: errorStatus[code],
    code,
    detail: message,
    requestId,
  };
}

/** Failures of the libraries at the edge, in our own terms; null for what nobody expected. */
function knownError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof ZodError) {
    const issues: Issue[] = error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
    const first = issues[0];
    const place = first === undefined || first.path === '' ? '' : `${first.path}: `;
    return new AppError('invalid-input', `${place}${first?.message ?? 'The request is not as described.'}`, { issues });
  }
  if (error instanceof multer.MulterError) {
    return new AppError(
      error.code === 'LIMIT_FILE_SIZE' ? 'too-large' : 'invalid-input',
      `The upload was refused: ${error.message}.`,
    );
  }
  return bodyError(error);
}

function bodyError(error: unknown): AppError | null {
  const { type, status } = (error ?? {}) as { type?: unknown; status?: unknown };
  if (type === 'entity.too.large') return new AppError('too-large', 'The request is larger than this route takes.');
  if (type === 'entity.parse.failed') return new AppError('invalid-input', 'The request is not valid JSON.');
  if (error instanceof URIError) return new AppError('invalid-input', 'The address is not well formed.');
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new AppError('invalid-input', error instanceof Error ? error.message : 'The request is not as described.');
  }
  return null;
}
