import type { ErrorRequestHandler, Request, Response } from 'express';
import type { Problem, ProblemCode } from '#shared/contracts/problem.ts';
import { AppError } from './app-error.ts';
import { requestIdOf } from './request-id.ts';

interface Kind {
  readonly status: number;
  readonly title: string;
  readonly detail: string;
}

/** The one table that gives each code its status and its usual words. */
export const PROBLEMS: Readonly<Record<ProblemCode, Kind>> = {
  'not-signed-in': { status: 401, title: 'Not signed in', detail: 'Sign in to go on.' },
  'not-allowed': { status: 403, title: 'Not allowed', detail: 'Your role in this house does not include this. Ask the owner of the house.' },
  'not-found': { status: 404, title: 'Not found', detail: 'There is nothing at this address in your house.' },
  stale: { status: 409, title: 'Saved by someone else', detail: 'Someone saved a newer version. Compare both and choose.' },
  invalid: { status: 422, title: 'Something needs another look', detail: 'Correct the points listed and send it again.' },
  'in-use': { status: 409, title: 'Still in use', detail: 'A product still uses it. Take it out there first.' },
  'too-large': { status: 413, title: 'Too large', detail: 'What was sent is larger than is taken here.' },
  'unsupported-file': { status: 415, title: 'Not a kind of file taken here', detail: 'Send a PDF, or a photo as JPEG, PNG or WebP.' },
  'wrong-origin': { status: 403, title: 'Sent from another place', detail: 'Reload the page and try again.' },
  'too-many-requests': { status: 429, title: 'Too many at once', detail: 'Wait a little and try again.' },
  'does-not-fit': { status: 422, title: 'The label does not fit', detail: 'Choose a larger label or shorten its text.' },
  unavailable: { status: 503, title: 'Not available now', detail: 'A service behind this is not answering. Try again in a minute.' },
  internal: { status: 500, title: 'Something went wrong here', detail: 'Nothing was changed. Try again; if it stays, pass on the request number.' },
};

/** Answers with an RFC 9457 problem document. */
export function sendProblem(req: Request, res: Response, error: AppError): void {
  const kind = PROBLEMS[error.code];
  const body: Problem = {
    type: `urn:colophon:problem:${error.code}`,
    title: kind.title,
    status: kind.status,
    detail: error.details.message ?? kind.detail,
    code: error.code,
    requestId: requestIdOf(req),
    ...(error.details.issues ? { issues: [...error.details.issues] } : {}),
    ...(error.details.current === undefined ? {} : { current: error.details.current }),
  };
  res.status(kind.status).set('Cache-Control', 'no-store').type('application/problem+json').send(JSON.stringify(body));
}

/** Where unexpected errors are written; the request number ties a report to its line. */
export type LogFault = (entry: { readonly requestId: string; readonly method: string; readonly path: string; readonly error: unknown }) => void;

/** The last middleware: a known refusal is answered as such, anything else is logged and answered as `internal`. */
export function errorMiddleware(log: LogFault): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    if (res.headersSent) {
      next(error);
      return;
    }
    const known = error instanceof AppError ? error : translate(error);
    if (known) {
      sendProblem(req, res, known);
      return;
    }
    log({ requestId: requestIdOf(req), method: req.method, path: req.path, error });
    sendProblem(req, res, new AppError('internal'));
  };
}

/** Faults of the framework, the body reader and the database's connection that have a code of their own. */
function translate(error: unknown): AppError | undefined {
  if (typeof error !== 'object' || error === null) return undefined;
  const fault: Faulty = error;
  if (fault.type === 'entity.too.large') return new AppError('too-large');
  if (fault.type === 'entity.parse.failed') return new AppError('invalid', { issues: [{ pointer: '', message: 'This is not JSON.' }] });
  if (fault.type === 'request.aborted' || fault.type === 'request.size.invalid') return new AppError('invalid', { message: 'The data broke off on the way. Send it again.' });
  if (fault.type === 'charset.unsupported' || fault.type === 'encoding.unsupported') {
    return new AppError('invalid', { message: 'Send it as plain JSON in UTF-8.' });
  }
  // Express throws a URIError for a broken %-escape in a path: no such address.
  if (error instanceof URIError || (fault.status === 400 && fault.expose === true)) return new AppError('not-found');
  const shortage = shortageOf(error);
  if (shortage) return new AppError('unavailable', { message: shortage });
  if (isConnectionFault(error)) return new AppError('unavailable');
  return undefined;
}

interface Faulty {
  readonly type?: unknown;
  readonly status?: unknown;
  readonly expose?: unknown;
  readonly code?: unknown;
  readonly cause?: unknown;
  readonly name?: unknown;
}

/** What the database has run out of, in words (PostgreSQL manual, appendix A, classes 53 and 57). */
const SHORTAGES: Readonly<Record<string, string>> = {
  '53100': 'The disk of the database is full. Nothing was changed. Make room on it, then try again.',
  '53200': 'The database is short of memory. Nothing was changed. Try again in a minute.',
  '53300': 'The database takes no more connections now. Nothing was changed. Try again in a minute.',
  '57014': 'The database took too long. Nothing was changed. Try again in a minute.',
};

function shortageOf(error: unknown): string | undefined {
  for (const { code } of causesOf(error)) if (typeof code === 'string' && SHORTAGES[code]) return SHORTAGES[code];
  return undefined;
}

/** An error and what lies behind it, the driver's own fault last. */
function* causesOf(error: unknown): Generator<Faulty> {
  for (let fault: unknown = error; typeof fault === 'object' && fault !== null; fault = (fault as Faulty).cause) yield fault as Faulty;
}

const CONNECTION_CODES = new Set(['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'ENOTFOUND', '57P01', '57P02', '57P03', '53300', '08001', '08003', '08006']);

/** True where the database (or the pool in front of it) does not answer. */
export function isConnectionFault(error: unknown): boolean {
  return [...causesOf(error)].some(
    (fault) =>
      (typeof fault.code === 'string' && CONNECTION_CODES.has(fault.code)) ||
      fault.name === 'KnexTimeoutError' ||
      (fault instanceof Error && /^(Connection terminated|Unable to acquire a connection|timeout exceeded when trying to connect)/.test(fault.message)),
  );
}
