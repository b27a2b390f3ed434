import express, { type Request, type Response, type Router } from 'express';
import type { AuthDeps, AuthEvent } from './auth-deps.ts';
import { clearCookie, readCookie, setCookie } from './cookies.ts';
import type { Identity } from './identity-client.ts';
import { escapeHtml, renderPage, sendPage } from './page.ts';
import { safeNext } from './safe-next.ts';
import { newSecret } from './secret.ts';
import { ABSOLUTE_SECONDS, beginSession, rememberPerson, removeSession, removeSessionOf } from './sessions.ts';
import type { AppSession } from './session.types.ts';
import { ATTEMPT_SECONDS, rememberAttempt, takeAttempt } from './sign-in-attempts.ts';

/**
 * The pages of sign-in, mounted at `/auth`:
 * `GET /sign-in?next=/path` (`&fresh=yes` asks for a new proof), `GET /callback`, `GET /signed-out`.
 */
export function createAuthRouter(deps: AuthDeps): Router {
  const router = express.Router();
  router.get('/sign-in', (req, res) => startSignIn(deps, req, res));
  router.get('/callback', (req, res) => finishSignIn(deps, req, res));
  router.get('/signed-out', (_req, res) => sendPage(res, 200, renderPage('You are signed out', `<p>Nothing of your house is kept in this browser.</p><p class="act"><a class="button" href="/auth/sign-in">Sign in again</a></p>`)));
  return router;
}

/**
 * Ends the request's session, for `DELETE /api/session`.
 * @returns where the page goes next, so that the identity service forgets the person too
 */
export async function endSession(deps: AuthDeps, session: AppSession, res: Response): Promise<{ signedOut: true; next: string }> {
  await removeSession(deps.query, session.id);
  clearCookie(res, deps.publicUrl, 'session');
  res.set('Clear-Site-Data', '"cache", "storage"');
  report(deps, { kind: 'signed-out', personId: session.person.id });
  // Signing out here must work while the identity service is away.
  const there = await deps.identity.signOutUrl().catch(() => undefined);
  return { signedOut: true, next: there?.href ?? '/auth/signed-out' };
}

async function startSignIn(deps: AuthDeps, req: Request, res: Response): Promise<void> {
  res.set('Cache-Control', 'no-store');
  // Cookies belong to a host: begin where the callback will arrive.
  if (req.get('Host') !== deps.publicUrl.host) {
    res.redirect(302, new URL(`/auth/sign-in${queryOf(req)}`, deps.publicUrl).href);
    return;
  }
  const attempt = deps.identity.newAttempt();
  const browser = newSecret();
  const target = await deps.identity.signInUrl(attempt, { fresh: req.query['fresh'] === 'yes' }).catch(() => undefined);
  if (!target) {
    sendPage(res, 503, renderPage('Sign-in is not available now', `<p>The identity service does not answer. Try again in a minute.</p><p class="act"><a class="button" href="/auth/sign-in">Try again</a></p>`));
    return;
  }
  await rememberAttempt(deps.query, deps.now(), browser, { ...attempt, next: safeNext(req.query['next']) });
  setCookie(res, deps.publicUrl, 'attempt', browser, ATTEMPT_SECONDS);
  res.redirect(302, target.href);
}

async function finishSignIn(deps: AuthDeps, req: Request, res: Response): Promise<void> {
  res.set('Cache-Control', 'no-store');
  const now = deps.now();
  const browser = readCookie(req, deps.publicUrl, 'attempt');
  clearCookie(res, deps.publicUrl, 'attempt');
  const attempt = browser === undefined ? undefined : await takeAttempt(deps.query, now, browser);
  if (!attempt) {
    refuse(deps, res, 'no sign-in of this browser was waiting');
    return;
  }
  let who: Identity;
  try {
    who = await deps.identity.redeem(new URL(`/auth/callback${queryOf(req)}`, deps.publicUrl), attempt);
  } catch (error) {
    refuse(deps, res, nameOf(error));
    return;
  }
  const person = await rememberPerson(deps.query, now, who);
  const [house] = await deps.membershipsOf(person.id);
  if (!house) {
    report(deps, { kind: 'sign-in-refused', personId: person.id, reason: 'member of no house' });
    sendNoHouse(res, person.name, person.email);
    return;
  }
  // A session is new at every sign-in; the one that this browser had ends.
  const former = readCookie(req, deps.publicUrl, 'session');
  if (former !== undefined) await removeSessionOf(deps.query, former);
  const secret = await beginSession(deps.query, now, { personId: person.id, houseId: house.houseId, authTime: who.authTime, browser: req.get('User-Agent') ?? '' });
  setCookie(res, deps.publicUrl, 'session', secret, ABSOLUTE_SECONDS);
  report(deps, { kind: 'signed-in', personId: person.id });
  res.redirect(303, new URL(attempt.next, deps.publicUrl).href);
}

/** The same page whatever was wrong: it tells nothing about who exists. */
function refuse(deps: AuthDeps, res: Response, reason: string): void {
  report(deps, { kind: 'sign-in-refused', reason });
  sendPage(res, 400, renderPage('The sign-in was not finished', `<p>It took longer than ten minutes, was started in another window, or was used already. Nothing was changed.</p><p class="act"><a class="button" href="/auth/sign-in">Sign in</a></p>`));
}

function sendNoHouse(res: Response, name: string, email: string): void {
  sendPage(
    res,
    403,
    renderPage('No house yet', `<p>${escapeHtml(name)} (${escapeHtml(email)}) is known, but is not a member of a house. Ask the owner of your house to add you, then sign in again.</p><p class="act"><a class="button" href="/auth/sign-in?fresh=yes">Sign in as someone else</a></p>`),
  );
}

function report(deps: AuthDeps, event: Omit<AuthEvent, 'at'>): void {
  deps.onEvent?.({ ...event, at: deps.now() });
}

/** A fault's code or kind, never its text: that could quote a token. */
function nameOf(error: unknown): string {
  if (!(error instanceof Error)) return 'unknown';
  return 'code' in error && typeof error.code === 'string' ? error.code : error.name;
}

function queryOf(req: Request): string {
  const at = req.originalUrl.indexOf('?');
  return at < 0 ? '' : req.originalUrl.slice(at);
}
