import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

/** A new secret of 256 random bits, for a cookie. */
export function newSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** What is stored of a secret. */
export function hashOf(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}

/** The token that a page sends back with every change: follows from the session's secret and does not give it away. */
export function csrfTokenOf(secret: string): string {
  return createHash('sha256').update(`change-token:${secret}`).digest('base64url');
}

/** Compares two texts in a time that does not depend on where they differ. */
export function isSame(a: string, b: string): boolean {
  return timingSafeEqual(hashOf(a), hashOf(b));
}
