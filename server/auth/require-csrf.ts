import type { Request, RequestHandler } from 'express';
import { AppError } from '#server/http/app-error.ts';
import { isSame } from './secret.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface CsrfOptions {
  /** Where browsers reach the product; only its pages may ask for changes. */
  readonly publicUrl: URL;
  /** True for the addresses that take a file; there a form with parts is let through. */
  readonly takesFile?: (req: Request) => boolean;
}

/**
 * Lets a change through only when a page of ours asked for it: own origin,
 * a body in a form that no foreign page can send unasked, and the session's
 * token in the header `X-Colophon-Token`. Stands after `loadSession`.
 * @throws AppError `wrong-origin`, or `not-signed-in` when there is no session
 */
export function requireCsrf({ publicUrl, takesFile = () => false }: CsrfOptions): RequestHandler {
  return (req, _res, next) => {
    if (!SAFE.has(req.method)) {
      if (!isFromOurPage(req, publicUrl.origin) || !hasOurBody(req, takesFile(req))) throw new AppError('wrong-origin');
      if (!req.session) throw new AppError('not-signed-in');
      if (!isSame(req.get('X-Colophon-Token') ?? '', req.session.csrfToken)) throw new AppError('wrong-origin');
    }
    next();
  };
}

/** Both headers are set by browsers alone; one must be there, and none may speak against it. */
function isFromOurPage(req: Request, origin: string): boolean {
  const from = req.get('Origin');
  const site = req.get('Sec-Fetch-Site');
  if (from === undefined && site === undefined) return false;
  return (from === undefined || from === origin) && (site === undefined || site === 'same-origin');
}

function hasOurBody(req: Request, mayBeFile: boolean): boolean {
  const type = (req.get('Content-Type') ?? '').split(';', 1)[0]?.trim().toLowerCase();
  if (type === 'application/json') return true;
  if (type === 'multipart/form-data') return mayBeFile;
  const hasNone = type === '' && req.get('Transfer-Encoding') === undefined && (req.get('Content-Length') ?? '0') === '0';
  return hasNone;
}
