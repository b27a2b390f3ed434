import fc from 'fast-check';
import request from 'supertest';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { MAUD } from '#server/local/demo-people.ts';
import { demoId } from '#server/db/demo/demo-id.ts';
import { openTestApp, type Client, type TestApp } from '#tests/support/app.ts';
import { callRoute, nameOf } from '#tests/support/route-calls.ts';

vi.setConfig({ testTimeout: 120_000 });

let stage: TestApp;
let maud: Client;
beforeAll(async () => {
  stage = await openTestApp();
  maud = await stage.as(MAUD);
}, 120_000);
afterAll(() => stage.close());

test('C-03 every answer carries the strict headers, and none of another origin\'s', async () => {
  for (const path of ['/', '/products/anything', '/assets/main-abc123.js', '/api/session', '/api/nothing', '/healthz', '/assets/gone.js']) {
    const { headers } = await request(stage.app).get(path).set('Origin', 'https://elsewhere.example');
    expect(headers['content-security-policy'], path).toBe("default-src 'self';img-src 'self' data: blob:;object-src 'none';base-uri 'none';form-action 'self';frame-ancestors 'none'");
    expect(headers, path).toMatchObject({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'same-origin', 'cross-origin-opener-policy': 'same-origin' });
    expect(Object.keys(headers).filter((name) => name.startsWith('access-control-') || name === 'x-powered-by'), path).toEqual([]);
  }
});

test('the page answers every address that is no file, anew each time; named files stay', async () => {
  const page = await request(stage.app).get('/products/anything');
  expect([page.status, page.headers['cache-control'], page.text]).toEqual([200, 'no-cache', '<!doctype html><title>Colophon</title>\n']);
  const file = await request(stage.app).get('/assets/main-abc123.js');
  expect([file.status, file.headers['cache-control']]).toEqual([200, 'public, max-age=31536000, immutable']);
  expect((await request(stage.app).get('/assets/gone.js')).status).toBe(404);
  expect((await request(stage.app).post('/products')).status).toBe(404);
  expect((await request(stage.app).get('/..%2f..%2fpackage.json')).text).not.toContain('"dependencies"');
});

test('an unknown address below /api is a problem document that is not kept', async () => {
  const { status, headers, body } = await maud.get('/nothing');
  expect([status, headers['content-type'], headers['cache-control']]).toEqual([404, 'application/problem+json; charset=utf-8', 'no-store']);
  expect(body).toMatchObject({ type: 'urn:colophon:problem:not-found', code: 'not-found', requestId: headers['x-request-id'] });
  expect((await maud.get('/products/%E0%A4%A')).status).toBe(404);
});

test('the law tables are kept by their tag', async () => {
  const first = await maud.get('/law');
  expect([first.status, first.headers['cache-control']]).toEqual([200, 'private, no-cache']);
  expect(first.body.tables.rows.length).toBeGreaterThan(0);
  expect((await maud.get('/law').set('If-None-Match', first.headers['etag']!)).status).toBe(304);
  expect((await maud.get('/categories')).body.items).toContainEqual({ slug: 'body-wash', title: expect.any(String) as string, exposure: 'rinse-off', decorative: false });
});

test('signing out ends the session at once', async () => {
  const one = await stage.as(MAUD);
  expect((await one.get('/session')).body).toMatchObject({ person: { name: 'Maud Pellow' }, house: { name: 'Brackenmere Bathhouse', roles: ['owner', 'formulator'] } });
  expect((await one.delete('/session')).body).toMatchObject({ signedOut: true });
  expect((await one.get('/session')).status).toBe(401);
});

test('what is not JSON, not whole or packed is refused in plain words', async () => {
  const post = (type: string, text: string) => maud.post('/materials').set('Content-Type', type).send(text);
  expect((await post('application/json', '{"tradeName": ')).body.issues).toEqual([{ pointer: '', message: 'This is not JSON.' }]);
  expect((await post('application/json', 'null')).status).toBe(422);
  expect((await post('application/json; charset=utf-32', '{}')).status).toBe(422);
  expect((await maud.post('/materials').set('Content-Type', 'application/json').set('Content-Encoding', 'gzip').send('{}')).status).toBe(422);
});

test('E-01 no body, however odd, is answered with a fault of ours', async () => {
  const product = demoId('product Reed Lip Balm');
  const writes = stage.routes.filter((one) => one.endpoint.body !== undefined && one.endpoint.accepts !== 'multipart' && nameOf(one) !== 'PUT /session/house');
  const { product: standing } = (await maud.get(`/products/${product}`)).body;
  const odd = fc.oneof(
    fc.jsonValue(),
    fc.constantFrom('\u0000', '\ud800', '1e309', '9'.repeat(400), "'; drop table product; --", '__proto__', -0, 1e308, null, [], {}),
  );
  const mutated = fc.tuple(fc.constantFrom(...Object.keys(standing.draft as object)), odd).map(([key, value]) => ({ version: 1, draft: { ...standing.draft, [key]: value } }));
  await fc.assert(
    fc.asyncProperty(fc.constantFrom(...writes), fc.oneof(odd, mutated, fc.object({ maxDepth: 4, withNullPrototype: false })), async (one, body) => {
      const answer = await callRoute(maud, one, { id: product }, body);
      expect(answer.status, nameOf(one)).toBeLessThan(500);
    }),
    { numRuns: 400 },
  );
  expect(stage.faults).toEqual([]);
});

test('E-06 hostile words in every query find nothing and break nothing', async () => {
  const words = ["'", '"; select pg_sleep(9)--', '%', '\\', '$1', '?', '??', '{}', '%00', 'a'.repeat(255), '\u202e'];
  for (const word of words) {
    for (const path of ['/products', '/materials', '/dictionary']) {
      expect((await maud.get(`${path}?find=${encodeURIComponent(word)}`)).status, word).toBeLessThan(500);
    }
    expect((await maud.get(`/dictionary/search?q=${encodeURIComponent(word)}`)).status, word).toBeLessThan(500);
  }
  expect((await maud.get(`/products?find=${'a'.repeat(10_000)}`)).status).toBe(422);
  expect((await maud.get('/products?find=%00')).status).toBe(422);
  expect(stage.faults).toEqual([]);
});

test('C-02 reading changes no row', async () => {
  const sum = () =>
    Promise.all(['house', 'membership', 'material', 'material_document', 'product', 'product_material', 'product_revision'].map((table) => stage.orm.em.fork().transactional((em) => em.execute("select set_config('app.house', ?, true)", [MAUD.houseId]).then(() => em.execute(`select md5(coalesce(string_agg(t::text, '' order by t::text), '')) from ${table} t`)))));
  const before = await sum();
  for (const one of stage.routes.filter(({ endpoint }) => endpoint.method === 'GET')) {
    await callRoute(maud, one, { id: demoId(one.endpoint.path.startsWith('/materials') ? 'material lavender' : 'product Reed Lip Balm') });
  }
  expect(await sum()).toEqual(before);
});

test('the server says that it is well while its database answers', async () => {
  expect((await request(stage.app).get('/healthz')).body).toEqual({ ok: true });
});
