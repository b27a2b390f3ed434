/**
 * The token that every change carries, and who wants to know that a session has ended.
 * Both stay in memory: neither is ever written to the browser's storage.
 */
let token = '';
const listeners = new Set<() => void>();

export function setCsrfToken(value: string): void {
  token = value;
}
export function csrfHeader(): Record<string, string> {
  return token ? { 'X-Colophon-Token': token } : {};
}
/** Calls `listener` whenever a request was refused as not signed in; returns how to stop. */
export function onSessionEnded(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
export function announceSessionEnded(): void {
  for (const listener of listeners) listener();
}
