import type { Route } from '#server/http/route.ts';
import type { Test } from 'supertest';
import type { Client } from './app.ts';

/** `PUT /products/:id`: how a route is named in tables. */
export function nameOf({ endpoint }: Pick<Route, 'endpoint'>): string {
  return `${endpoint.method} ${endpoint.path}`;
}

/** Calls a route with given ids and body, as the browser would. */
export function callRoute(client: Client, { endpoint }: Pick<Route, 'endpoint'>, ids: Readonly<Record<string, string>> = {}, body: unknown = {}): Test {
  const path = endpoint.path.replaceAll(/:([a-zA-Z]+)/g, (_sign, name: string) => ids[name] ?? '00000000-0000-4000-8000-000000000000');
  switch (endpoint.method) {
    case 'GET':
      return client.get(path);
    case 'DELETE':
      return client.delete(path);
    case 'PUT':
      return client.put(path, body);
    case 'POST':
      if (endpoint.accepts === 'multipart') return client.post(path).field('kind', 'other').attach('file', Buffer.from('%PDF-1.7\n%%EOF\n'), 'sheet.pdf');
      return client.post(path, body);
    case 'PATCH':
      throw new Error('no route patches');
  }
}
