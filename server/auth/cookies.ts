import type { CookieOptions, Request, Response } from 'express';

export type CookieKind = 'session' | 'attempt';

/** Short enough for a secret of ours, long enough for no other use. */
const SECRET = /^[A-Za-z0-9_-]{43}$/;

/** `__Host-` binds a cookie to this host over https; a browser refuses that name over http, so loopback has a plain one. */
export function cookieName(publicUrl: URL, kind: CookieKind): string {
  const plain = kind === 'session' ? 'colophon' : 'colophon-sign-in';
  return isSecure(publicUrl) ? `__Host-${plain}` : plain;
}

/** The secret that the browser sent, if it has the form of ours. A name sent twice counts as not sent. */
export function readCookie(req: Request, publicUrl: URL, kind: CookieKind): string | undefined {
  const name = cookieName(publicUrl, kind);
  const found = (req.headers.cookie ?? '').split(';').flatMap((pair) => {
    const at = pair.indexOf('=');
    return at > 0 && pair.slice(0, at).trim() === name ? [pair.slice(at + 1).trim()] : [];
  });
  const [value] = found;
  return found.length === 1 && value !== undefined && SECRET.test(value) ? value : undefined;
}

/** @param seconds how long the browser keeps it */
export function setCookie(res: Response, publicUrl: URL, kind: CookieKind, secret: string, seconds: number): void {
  res.cookie(cookieName(publicUrl, kind), secret, { ...attributes(publicUrl), maxAge: seconds * 1000 });
}

export function clearCookie(res: Response, publicUrl: URL, kind: CookieKind): void {
  res.clearCookie(cookieName(publicUrl, kind), attributes(publicUrl));
}

function attributes(publicUrl: URL): CookieOptions {
  return { httpOnly: true, sameSite: 'lax', path: '/', secure: isSecure(publicUrl) };
}

function isSecure(publicUrl: URL): boolean {
  return publicUrl.protocol === 'https:';
}
