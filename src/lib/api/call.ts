import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { readAnswer } from './answer.ts';
import { OfflineError } from './error.ts';
import { csrfHeader } from './session-token.ts';
import { urlOf } from './url.ts';

type Given<T, Key extends string> = T extends z.ZodType ? (unknown extends z.input<T> ? object : { [K in Key]: z.input<T> }) : object;
/** What an endpoint wants: `params`, `query` and `body`, as far as its contract has them. */
export type InputOf<E extends Endpoint> = Given<Exclude<E['params'], undefined>, 'params'> &
  Partial<Given<Exclude<E['query'], undefined>, 'query'>> &
  Given<Exclude<E['body'], undefined>, 'body'>;
export type AnswerOf<E extends Endpoint> = z.output<E['response']>;

interface Loose {
  readonly params?: Readonly<Record<string, unknown>>;
  readonly query?: Readonly<Record<string, unknown>>;
  readonly body?: unknown;
}

/**
 * The only way from the browser to the server: sends `input` to an endpoint and reads the
 * answer with the endpoint's own schema.
 * @throws ApiError with the server's refusal, OfflineError when it cannot be reached.
 */
export async function call<E extends Endpoint>(endpoint: E, input?: InputOf<E>, signal?: AbortSignal): Promise<AnswerOf<E>> {
  const { params, query, body } = (input ?? {}) as Loose;
  const changes = endpoint.method !== 'GET';
  const response = await reach(urlOf(endpoint, { params, query }), {
    method: endpoint.method,
    credentials: 'same-origin',
    signal,
    headers: {
      accept: 'application/json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...(changes ? csrfHeader() : {}),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
  });
  return readAnswer(endpoint, { status: response.status, text: await response.text() }) as AnswerOf<E>;
}

async function reach(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, init);
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw new OfflineError();
  }
}
