import { afterAll, beforeAll, expect, test } from 'vitest';
import { openSignInStage, type SignInStage } from '#tests/support/sign-in-stage.ts';

let stage: SignInStage;
let cookie: string;
let token: string;
beforeAll(async () => {
  stage = await openSignInStage();
  const browser = await stage.signIn();
  cookie = `colophon=${browser.cookie('colophon')!}`;
  token = ((await (await browser.get(`${stage.url}/api/session`)).json()) as { csrfToken: string }).csrfToken;
}, 120_000);
afterAll(() => stage.stop());

type Headers = Readonly<Record<string, string | undefined>>;
async function change(headers: Headers, path = '/api/change'): Promise<number> {
  const all = { Cookie: cookie, Origin: stage.url, 'Content-Type': 'application/json', 'X-Colophon-Token': token, ...headers };
  const sent = Object.entries(all).flatMap(([name, value]) => (value === undefined ? [] : [[name, value] as [string, string]]));
  return (await fetch(stage.url + path, { method: 'POST', headers: sent, body: '{}' })).status;
}

test('C-01 a change from our own page goes through', async () => {
  expect(await change({})).toBe(200);
});

// fetch cannot set Sec-Fetch-Site itself, so the browser's own sign stands in for the header here.
test.each<readonly [string, Headers]>([
  ['a form', { 'Content-Type': 'application/x-www-form-urlencoded' }],
  ['a form with parts', { 'Content-Type': 'multipart/form-data; boundary=x' }],
  ['plain text', { 'Content-Type': 'text/plain' }],
  ['JSON dressed as text', { 'Content-Type': 'text/plain; charset=application/json' }],
  ['no type at all', { 'Content-Type': '' }],
  ['another origin', { Origin: 'https://elsewhere.example' }],
  ['an origin that begins like ours', { Origin: 'http://127.0.0.1.elsewhere.example' }],
  ['our host over another scheme', { Origin: 'https://127.0.0.1' }],
  ['a null origin', { Origin: 'null' }],
  ['no token', { 'X-Colophon-Token': undefined }],
  ['an empty token', { 'X-Colophon-Token': '' }],
  ['another token', { 'X-Colophon-Token': 'A'.repeat(43) }],
])('C-01 a change sent as %s is refused', async (_what, headers) => {
  expect(await change(headers)).toBe(403);
});

test('C-01 a change without a session asks for sign-in', async () => {
  expect(await change({ Cookie: undefined })).toBe(401);
});

test('C-01 a form with parts passes only where a file is taken', async () => {
  expect(await change({ 'Content-Type': 'multipart/form-data; boundary=x' }, '/api/upload')).toBe(200);
});
