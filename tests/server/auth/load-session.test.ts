import { afterAll, beforeAll, expect, test } from 'vitest';
import type { BrowserLike } from '#tests/support/browser-like.ts';
import { openSignInStage, type SignInStage } from '#tests/support/sign-in-stage.ts';

let stage: SignInStage;
beforeAll(async () => {
  stage = await openSignInStage();
}, 120_000);
afterAll(() => stage.stop());

const status = async (browser: BrowserLike) => (await browser.get(`${stage.url}/api/session`)).status;

test('B-03 a session unused for 59 min 59 s still holds', async () => {
  const browser = await stage.signIn();
  stage.pass(3598);
  expect(await status(browser)).toBe(200);
});

test('B-03 a session unused for 60 min 1 s has ended', async () => {
  const browser = await stage.signIn();
  stage.pass(3601);
  expect(await status(browser)).toBe(401);
});

test('B-03 a busy session ends after 12 hours all the same', async () => {
  const browser = await stage.signIn();
  for (let used = 0; used < 14; used += 1) {
    stage.pass(50 * 60);
    expect(await status(browser)).toBe(200);
  }
  stage.pass(20 * 60 + 1);
  expect(await status(browser)).toBe(401);
});

test('B-04 a change of roles holds from the next request', async () => {
  const browser = await stage.signIn();
  const before = stage.memberships;
  stage.memberships = (email) => before(email).map((each) => ({ ...each, roles: ['seller'] }));
  const session = (await (await browser.get(`${stage.url}/api/session`)).json()) as { roles: string[] };
  stage.memberships = before;
  expect(session.roles).toEqual(['seller']);
});

test('B-04 leaving the last house ends the session for good', async () => {
  const browser = await stage.signIn();
  const before = stage.memberships;
  stage.memberships = () => [];
  expect(await status(browser)).toBe(401);
  stage.memberships = before;
  expect(await status(browser)).toBe(401);
});

test.each([
  ['too short', 'abc'],
  ['unknown', 'A'.repeat(43)],
  ['with a quote', `${'A'.repeat(42)}'`],
])('a secret that is %s signs nobody in', async (_what, secret) => {
  const answer = await fetch(`${stage.url}/api/session`, { headers: { Cookie: `colophon=${secret}` } });
  expect(answer.status).toBe(401);
});

test('two secrets under one name count as none', async () => {
  const browser = await stage.signIn();
  const secret = browser.cookie('colophon')!;
  const answer = await fetch(`${stage.url}/api/session`, { headers: { Cookie: `colophon=${secret}; colophon=${secret}` } });
  expect(answer.status).toBe(401);
});
