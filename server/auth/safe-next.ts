/** Where people land when nothing better is known. */
export const START_PAGE = '/';

const LONGEST = 512;
// Characters of a path, query and fragment (RFC 3986) and `%`; no backslash, blank or control character.
const ALLOWED = /^\/[A-Za-z0-9\-._~!$&'()*+,;=:@/?#[\]%]*$/;
// Escaped slash, backslash, dot, control characters, blank, and an escaped escape.
const HIDING = /%(?:2f|5c|2e|25|0[0-9a-f]|1[0-9a-f]|20|7f)/i;

/**
 * The address to go to after sign-in, if it is a page of ours; else the start
 * page. Only a path is taken, and only one that no reader of addresses could
 * see differently: no second slash, no dots that climb, nothing escaped that
 * hides a separator.
 */
export function safeNext(value: unknown): string {
  if (typeof value !== 'string' || value.length > LONGEST) return START_PAGE;
  if (!ALLOWED.test(value)) return START_PAGE;
  const path = value.split(/[?#]/, 1)[0] ?? '';
  if (path.includes('//') || HIDING.test(path) || path.includes('@')) return START_PAGE;
  if (path.split('/').some((step) => step === '.' || step === '..')) return START_PAGE;
  // Sign-in itself and the data addresses are not pages.
  if (/^\/(?:auth|api)(?:\/|$)/i.test(path)) return START_PAGE;
  const read = new URL(value, 'https://here.invalid');
  const isOurs = read.origin === 'https://here.invalid' && read.pathname === path;
  return isOurs ? value : START_PAGE;
}
