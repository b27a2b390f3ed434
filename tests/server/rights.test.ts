import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { Router } from 'express';
import { endpoint } from '#shared/contracts/endpoint.ts';
import { role as roleSchema, type Role } from '#shared/contracts/session.contract.ts';
import { z } from 'zod';
import { mountRoutes, route, type Route } from '#server/http/route.ts';
import { openTestApp, personWith, type Client, type TestApp } from '#tests/support/app.ts';
import { callRoute, nameOf } from '#tests/support/route-calls.ts';
import type { DemoPerson } from '#server/local/demo-people.ts';
import { MAUD } from '#server/local/demo-people.ts';

vi.setConfig({ testTimeout: 60_000 });

const ALL: readonly Role[] = roleSchema.options;
const MAKERS: readonly Role[] = ['owner', 'formulator'];

/** Who may call what, written down a second time: a change of the policy must be made here too. */
const MATRIX: Readonly<Record<string, readonly Role[]>> = {
  'GET /session': ALL,
  'DELETE /session': ALL,
  'PUT /session/house': ALL,
  'GET /house': ALL,
  'PUT /house': ['owner'],
  'GET /law': ALL,
  'GET /categories': ALL,
  'GET /materials': ALL,
  'GET /materials/:id': ALL,
  'POST /materials': MAKERS,
  'PUT /materials/:id': MAKERS,
  'POST /materials/:id/archive': MAKERS,
  'POST /materials/:id/documents': MAKERS,
  'GET /materials/:id/documents/:documentId': ALL,
  'DELETE /materials/:id/documents/:documentId': MAKERS,
  'GET /products': ALL,
  'POST /products': MAKERS,
  'POST /products/import': MAKERS,
  'GET /products/:id': ALL,
  'PUT /products/:id': [...MAKERS, 'artworker'],
  'POST /products/:id/copy': MAKERS,
  'POST /products/:id/archive': MAKERS,
  'GET /products/:id/formula-document': ALL,
  'GET /products/:id/result': ALL,
  'GET /products/:id/evidence': ALL,
  'POST /products/:id/evidence': MAKERS,
  'GET /products/:id/evidence/:documentId': ALL,
  'DELETE /products/:id/evidence/:documentId': MAKERS,
  'GET /products/:id/front': ALL,
  'GET /products/:id/revisions': ALL,
  'GET /products/:id/revisions/:version': ALL,
  'GET /products/:id/label.pdf': ALL,
  'GET /products/:id/report.pdf': ALL,
  'GET /products/:id/weigh-out.pdf': ALL,
  'GET /dictionary': ALL,
  'GET /dictionary/search': ALL,
  'POST /dictionary/resolve': ALL,
  'GET /dictionary/oils': ALL,
  'GET /dictionary/names': ALL,
  'GET /dictionary/inventory': ALL,
  'POST /dictionary/inventory': ['owner'],
  'DELETE /dictionary/inventory': ['owner'],
  'GET /pictures': ALL,
  'POST /pictures': [...MAKERS, 'artworker'],
  'GET /pictures/:id/preview': ALL,
  'DELETE /pictures/:id': [...MAKERS, 'artworker'],
  'GET /trail': ALL,
  'GET /trail/verify': ALL,
  'GET /trail/export': ALL,
};

let stage: TestApp;
beforeAll(async () => {
  stage = await openTestApp();
}, 120_000);
afterAll(() => stage.close());

function holderOf(role: Role): DemoPerson {
  return role === 'owner' ? MAUD : personWith(role);
}

test('every route stands in the matrix, and nothing else does', () => {
  expect(stage.routes.map(nameOf).sort()).toEqual(Object.keys(MATRIX).sort());
});

test('signed out, every route answers 401 and nothing more', async () => {
  for (const one of stage.routes) {
    const answer = await callRoute(stage.signedOut, one);
    expect([nameOf(one), answer.status, (answer.body as { code: string }).code]).toEqual([nameOf(one), 401, 'not-signed-in']);
  }
});

// The owner of the demo is a formulator too; the policy's own test holds the roles apart.
test.each(ALL)('%s is refused exactly what the matrix withholds', async (role) => {
  const held: readonly Role[] = holderOf(role).roles;
  const refused: string[] = [];
  let me: Client | undefined;
  for (const one of stage.routes) {
    me ??= await stage.as(holderOf(role));
    const answer = await callRoute(me, one);
    expect(answer.status, nameOf(one)).toBeLessThan(500);
    if (answer.status === 403) refused.push(nameOf(one));
    if (nameOf(one) === 'DELETE /session') me = undefined;
  }
  const withheld = Object.entries(MATRIX).filter(([, roles]) => !roles.some((one) => held.includes(one)));
  expect(refused.sort()).toEqual(withheld.map(([name]) => name).sort());
  expect(stage.faults).toEqual([]);
});

const somewhere = endpoint({ method: 'GET', path: '/somewhere', response: z.object({}) });

test('a route without a declared right does not start', () => {
  const careless = { endpoint: somewhere, handle: () => Promise.resolve({}) } as unknown as Route;
  expect(() => mountRoutes(Router(), [careless], stage.orm.em)).toThrow('route GET /somewhere declares no right');
  const empty = { endpoint: somewhere, rule: {}, handle: () => Promise.resolve({}) } as unknown as Route;
  expect(() => mountRoutes(Router(), [empty], stage.orm.em)).toThrow('route GET /somewhere declares no right');
});

test('two routes on one address do not start', () => {
  const one = route(somewhere, { may: 'signed-in' }, () => Promise.resolve({}));
  expect(() => mountRoutes(Router(), [one, one], stage.orm.em)).toThrow('route GET /somewhere is mounted twice');
});
