import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';
import { ZodError } from 'zod';
import { databaseTrouble, isDuplicate } from '../platform/database.ts';
import type { Deps } from '../platform/deps.ts';
import { StorageDown, StorageRefused } from '../platform/storage.ts';

/** Everything that can be told to go wrong, with its status and the words for it. */
const KINDS = {
  'bad-request': { status: 400, title: 'The request could not be read' },
  'signed-out': { status: 401, title: 'Please sign in' },
  'wrong-password': { status: 401, title: 'That address and password do not belong together' },
  forbidden: { status: 403, title: 'Not allowed' },
  'foreign-origin': { status: 403, title: 'This came from another site' },
  'not-found': { status: 404, title: 'Not found' },
  conflict: { status: 409, title: 'Already exists' },
  'still-running': { status: 409, title: 'The same request is still being answered' },
  gone: { status: 410, title: 'No longer there' },
  'stale-version': { status: 412, title: 'Someone saved before you' },
  'too-large': { status: 413, title: 'Too large' },
  unsupported: { status: 415, title: 'Not a kind of file that can be used here' },
  'range-refused': { status: 416, title: 'No such part of the file' },
  invalid: { status: 422, title: 'Some fields need attention' },
  'over-quota': { status: 422, title: 'The studio has no room left for this' },
  'version-required': { status: 428, title: 'If-Match is required' },
  'rate-limited': { status: 429, title: 'Too many requests' },
  internal: { status: 500, title: 'Something went wrong on our side' },
  unavailable: { status: 503, title: 'Not available at the moment' },
  'storage-down': { status: 503, title: 'Files cannot be reached at the moment' },
} as const;
export type ProblemKind = keyof typeof KINDS;

/**
 * Thrown by services for expected failures. Knows nothing of Express; the handler below turns it into HTTP.
 * `detail` is a sentence for the person: what is kept and what to do. `extra` stands in the answer beside it.
 */
export class AppError extends Error {
  override name = 'AppError';
  readonly kind: ProblemKind;
  readonly extra: Readonly<Record<string, unknown>>;
  constructor(kind: ProblemKind, detail = '', extra: Readonly<Record<string, unknown>> = {}, options?: ErrorOptions) {
    super(detail, options);
    this.kind = kind;
    this.extra = extra;
  }

  get status(): number {
    return KINDS[this.kind].status;
  }

  get title(): string {
    return KINDS[this.kind].title;
  }
}

const KEPT = 'Nothing was lost; please try again in a moment.';

/** What body-parser and multer throw, by their own names. */
function fromReading(err: { type?: unknown; code?: unknown; name?: unknown; status?: unknown }): AppError | null {
  if (err.type === 'entity.too.large' || err.code === 'LIMIT_FILE_SIZE') return new AppError('too-large');
  if (err.type === 'encoding.unsupported' || err.type === 'charset.unsupported') return new AppError('unsupported');
  if (err.name === 'MulterError' || err.name === 'URIError') return new AppError('bad-request');
  if (err.type === 'entity.parse.failed') return new AppError('bad-request', 'The body is not JSON.');
  return typeof err.status === 'number' && err.status >= 400 && err.status < 500 ? new AppError('bad-request') : null;
}

/** Gives every error a kind; what nobody expected is `internal`. */
export function toAppError(err: unknown): AppError {
  if (err instanceof AppError) return err;
  const options = { cause: err };
  if (err instanceof ZodError) {
    const errors = err.issues.map((issue) => ({ pointer: `#/${issue.path.join('/')}`, detail: issue.message }));
    return new AppError('invalid', '', { errors }, options);
  }
  if (err instanceof StorageDown) return new AppError('storage-down', KEPT, {}, options);
  if (err instanceof StorageRefused) return new AppError('conflict', 'The upload is no longer there.', {}, options);
  if (isDuplicate(err)) return new AppError('conflict', '', {}, options);
  if (databaseTrouble(err)) return new AppError('unavailable', KEPT, {}, options);
  if (typeof err !== 'object' || err === null) return new AppError('internal', '', {}, options);
  return fromReading(err) ?? new AppError('internal', '', {}, options);
}

/**
 * Parses an answer by its contract, so that nothing leaves that the contract does not name.
 * @throws AppError internal when the contract refuses it: that is our fault, never the caller's
 */
export function answer<T>(schema: { parse(value: unknown): T }, value: unknown): T {
  try {
    return schema.parse(value);
  } catch (err) {
    throw new AppError('internal', '', {}, { cause: err });
  }
}

/** The body of RFC 9457 for an error. */
export function problemBody(err: AppError, res: Response): Record<string, unknown> {
  return {
    type: `/problems/${err.kind}`,
    title: err.title,
    status: err.status,
    ...(err.message && { detail: err.message }),
    instance: `urn:request:${String(res.getHeader('X-Request-Id') ?? '')}`,
    ...err.extra,
  };
}

/** What is not mounted is not there. */
export const noRoute: RequestHandler = () => {
  throw new AppError('not-found');
};

/** Logs an error once: our own faults with everything, refusals by policy with who and what. */
export function logProblem(deps: Pick<Deps, 'log'>, err: AppError, req: Request, personId: string | undefined): void {
  const line = { kind: err.kind, method: req.method, path: req.baseUrl + req.path, personId };
  if (err.status >= 500) deps.log.error({ ...line, err: err.cause ?? err }, 'request failed');
  else if (err.status === 401 || err.status === 403 || err.status === 404) deps.log.info(line, 'request refused');
}

/** The last middleware under /api; it never sends a stack, a query or a library's own message. */
export function problemHandler(
  deps: Pick<Deps, 'log'>,
  personOf: (req: Request) => string | undefined,
): ErrorRequestHandler {
  return (err: unknown, req, res, next) => {
    // The caller went away: there is nobody to answer, and nothing failed here.
    if (req.destroyed && !req.complete) return;
    const app = toAppError(err);
    logProblem(deps, app, req, personOf(req));
    if (res.headersSent) {
      next(err);
      return;
    }
    const { retryAfter } = app.extra;
    if (typeof retryAfter === 'number') res.set('Retry-After', String(retryAfter));
    res
      .status(app.status)
      .type('application/problem+json')
      .send(JSON.stringify(problemBody(app, res)));
  };
}
