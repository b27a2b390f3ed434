import { vi } from 'vitest';
import type { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import type { ProblemCode } from '#shared/contracts/problem.ts';
import type { Session } from '#shared/contracts/session.contract.ts';
import { getSession } from '#shared/contracts/session.contract.ts';

/** A request as an endpoint's answer sees it; a body is what was sent, unread. */
export interface Asked {
  readonly params: Readonly<Record<string, string>>;
  readonly query: URLSearchParams;
  readonly body: unknown;
}
type Answer<E extends Endpoint> = z.input<E['response']> | Refusal | Promise<z.input<E['response']> | Refusal>;

/** A refusal, written as the server writes them. */
export class Refusal {
  readonly status: number;
  readonly code: ProblemCode;
  readonly more: Readonly<Record<string, unknown>>;
  constructor(status: number, code: ProblemCode, more: Readonly<Record<string, unknown>> = {}) {
    this.status = status;
    this.code = code;
    this.more = more;
  }
}

interface Stand {
  readonly endpoint: Endpoint;
  readonly path: RegExp;
  readonly answer: (asked: Asked) => unknown;
}

/**
 * Stands in for the server behind the page's fetch. Endpoints answer by their contracts'
 * addresses; a request that nobody answers fails the test with its name.
 */
export class FakeServer {
  /** Every request, in order: `PUT /materials/:id`, with what it carried. */
  readonly asked: { readonly name: string; readonly body: unknown }[] = [];
  /** False: the connection is lost. */
  isReachable = true;
  readonly #stands: Stand[] = [];

  constructor() {
    vi.stubGlobal('fetch', (url: string, init: RequestInit) => this.#serve(url, init));
  }

  /** What an endpoint answers from now on; the latest word counts. */
  on<E extends Endpoint>(endpoint: E, answer: (asked: Asked) => Answer<E>): this {
    const path = new RegExp(`^/api${endpoint.path.replaceAll(/:(\w+)/g, '(?<$1>[^/]+)')}$`);
    this.#stands.unshift({ endpoint, path, answer });
    return this;
  }

  /** What was sent to an endpoint, first to last. */
  sent(endpoint: Endpoint): unknown[] {
    return this.asked.filter(({ name }) => name === `${endpoint.method} ${endpoint.path}`).map(({ body }) => body);
  }

  async #serve(url: string, init: RequestInit): Promise<Response> {
    if (!this.isReachable) throw new TypeError('no connection');
    const { pathname, searchParams } = new URL(url, 'http://colophon.example');
    const method = init.method ?? 'GET';
    for (const { endpoint, path, answer } of this.#stands) {
      const found = endpoint.method === method ? path.exec(pathname) : null;
      if (!found) continue;
      const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : (init.body ?? undefined);
      this.asked.push({ name: `${method} ${endpoint.path}`, body });
      const params = Object.fromEntries(Object.entries(found.groups ?? {}).map(([key, value]) => [key, decodeURIComponent(value)]));
      return respond(await answer({ params, query: searchParams, body }));
    }
    throw new Error(`Nobody answers ${method} ${pathname}`);
  }
}

function respond(answer: unknown): Response {
  if (!(answer instanceof Refusal)) return Response.json(answer);
  const { status, code, more } = answer;
  return Response.json({ type: 'about:blank', title: code, status, detail: `Refused: ${code}.`, code, requestId: 'r-1', ...more }, { status });
}

/** Somebody of the demo house, with these roles. */
export function signedIn(server: FakeServer, roles: Session['house']['roles'] = ['formulator']): FakeServer {
  const house = { id: '00000000-0000-4000-8000-0000000000aa', name: 'Brackenmere Bathhouse' };
  return server.on(getSession, () => ({
    person: { id: '00000000-0000-4000-8000-0000000000bb', name: 'Ines Tarrow', email: 'ines@brackenmere.example' },
    house: { ...house, roles },
    houses: [house],
    csrfToken: 'token',
    dataRelease: '2026-12',
  }));
}
