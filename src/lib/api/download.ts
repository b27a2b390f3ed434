import { problem } from '#shared/contracts/problem.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import type { InputOf } from './call.ts';
import { AnswerError, ApiError, OfflineError } from './error.ts';
import { announceSessionEnded } from './session-token.ts';
import { urlOf } from './url.ts';

/**
 * Fetches a file and hands it to the browser to keep, so that a refusal can be told in words
 * where a plain link would leave the page.
 * @throws ApiError with the server's refusal, OfflineError when it cannot be reached.
 */
export async function download<E extends Endpoint>(endpoint: E, input: Partial<InputOf<E>> & object): Promise<void> {
  const address = urlOf(endpoint, input as { params?: Record<string, unknown>; query?: Record<string, unknown> });
  const response = await fetch(address, { credentials: 'same-origin' }).catch(() => {
    throw new OfflineError();
  });
  if (!response.ok) {
    const read = problem.safeParse(await response.json().catch(() => null));
    if (!read.success) throw new AnswerError(`${endpoint.method} ${endpoint.path}`, `status ${response.status}`);
    if (read.data.code === 'not-signed-in') announceSessionEnded();
    throw new ApiError(read.data);
  }
  const link = document.createElement('a');
  link.href = URL.createObjectURL(await response.blob());
  link.download = nameOf(response.headers.get('content-disposition'));
  link.click();
  URL.revokeObjectURL(link.href);
}

/** The file name of a Content-Disposition header: RFC 6266, the encoded form first. */
export function nameOf(header: string | null): string {
  const encoded = /filename\*=UTF-8''([^;]+)/i.exec(header ?? '')?.[1];
  return encoded ? decodeURIComponent(encoded) : (/filename="([^"]*)"/.exec(header ?? '')?.[1] ?? 'colophon.pdf');
}
