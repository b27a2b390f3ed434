import { problem } from '#shared/contracts/problem.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { AnswerError, ApiError } from './error.ts';
import { announceSessionEnded } from './session-token.ts';

interface Received {
  readonly status: number;
  readonly text: string;
}

/** Reads a JSON answer with the endpoint's own schema. @throws ApiError, AnswerError */
export function readAnswer(endpoint: Endpoint, received: Received): unknown {
  const name = `${endpoint.method} ${endpoint.path}`;
  const body = parseJson(received.text, name);
  if (received.status >= 400) throw refusal(body, received.status, endpoint);
  const read = endpoint.response.safeParse(body);
  if (!read.success) throw new AnswerError(name, read.error.issues[0]?.message ?? 'unknown shape');
  return read.data;
}

function refusal(body: unknown, status: number, endpoint: Endpoint): Error {
  const read = problem.safeParse(body);
  if (!read.success) return new AnswerError(`${endpoint.method} ${endpoint.path}`, `status ${status}`);
  if (read.data.code === 'not-signed-in' && endpoint.path !== '/session') announceSessionEnded();
  return new ApiError(read.data);
}

function parseJson(text: string, name: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    throw new AnswerError(name, 'not JSON');
  }
}
