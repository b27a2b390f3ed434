import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { INES, MAUD, NEWCOMER, PIET } from '#server/local/demo-people.ts';
import { createBrowserLike } from '#tests/support/browser-like.ts';
import { openSignInStage, type SignInStage } from '#tests/support/sign-in-stage.ts';

let stage: SignInStage;
beforeAll(async () => {
  stage = await openSignInStage();
}, 120_000);
afterAll(() => stage.stop());
beforeEach(async () => {
  await stage.pool.query('delete from sign_in_attempt');
  await stage.pool.query('delete from session');
  stage.events.length = 0;
});

const sessionOf = async (browser: ReturnType<typeof createBrowserLike>) => browser.get(`${stage.url}/api/session`);

describe('the round trip', () => {
  test('a person who chooses herself at the identity service is signed in and lands where she wanted to go', async () => {
    const browser = createBrowserLike();
    const callback = await stage.upToCallback(browser, INES, '/products?sort=name');
    const done = await browser.get(callback);
    expect([done.status, done.headers.get('Location')]).toEqual([303, `${stage.url}/products?sort=name`]);
    const session = (await (await sessionOf(browser)).json()) as Record<string, unknown>;
    expect(session['person']).toMatchObject({ name: INES.name, email: INES.email });
    expect(session['roles']).toEqual(['formulator']);
    expect(Date.now() - Date.parse(String(session['authTime']))).toBeLessThan(60_000);
  });

  test('the request to the identity service asks for a code with PKCE S256 and nothing else', async () => {
    const start = await createBrowserLike().get(`${stage.url}/auth/sign-in`);
    const asked = new URL(start.headers.get('Location') ?? '').searchParams;
    expect(asked.get('response_type')).toBe('code');
    expect(asked.get('code_challenge_method')).toBe('S256');
    expect(asked.get('code_challenge')).toMatch(/^[\w-]{43}$/);
    expect(asked.get('redirect_uri')).toBe(`${stage.url}/auth/callback`);
  });

  // RFC 9700 section 2.1.1, RFC 7636 section 4.2.
  test.each([
    ['a plain challenge', { code_challenge_method: 'plain' }],
    ['no challenge', { code_challenge: undefined, code_challenge_method: undefined }],
    ['a token instead of a code', { response_type: 'token' }],
    ['another place to return to', { redirect_uri: 'http://127.0.0.1:9/auth/callback' }],
  ])('the identity service refuses %s', async (_what, change: Record<string, string | undefined>) => {
    const start = await createBrowserLike().get(`${stage.url}/auth/sign-in`);
    const target = new URL(start.headers.get('Location') ?? '');
    for (const [name, value] of Object.entries(change)) {
      if (value === undefined) target.searchParams.delete(name);
      else target.searchParams.set(name, value);
    }
    const answer = await createBrowserLike().get(target.href);
    const next = answer.headers.get('Location') ?? '';
    expect(next).not.toContain('/sign-in/');
    expect(answer.status === 400 || /[?&#]error=/.test(next)).toBe(true);
  });

  test('a name, an address and a person are known by issuer and subject: a changed e-mail is the same person', async () => {
    const first = (await (await sessionOf(await stage.signIn(PIET))).json()) as { person: { id: string } };
    await stage.pool.query("update person set email = 'old@brackenmere.example' where subject = $1", [PIET.id]);
    const second = (await (await sessionOf(await stage.signIn(PIET))).json()) as { person: { id: string; email: string } };
    expect(second.person).toMatchObject({ id: first.person.id, email: PIET.email });
  });

  test('the same subject from another issuer is another person', async () => {
    await stage.pool.query("insert into person (id, issuer, subject, name, email, created_at) values (gen_random_uuid(), 'https://elsewhere.example', $1, 'Another', $2, now())", [MAUD.id, MAUD.email]);
    const { person } = (await (await sessionOf(await stage.signIn(MAUD))).json()) as { person: { name: string } };
    expect(person.name).toBe(MAUD.name);
  });

  test('someone without a house is told so and has no session', async () => {
    const browser = createBrowserLike();
    const page = await browser.get(await stage.upToCallback(browser, NEWCOMER));
    expect(page.status).toBe(403);
    expect(await page.text()).toContain('No house yet');
    expect(browser.cookie('colophon')).toBeUndefined();
    expect(await stage.countSessions()).toBe(0);
  });
});

describe('A-02 answers that do not belong to the browser', () => {
  test('12 mix-ups of state, nonce and verifier between two browsers sign nobody in', async () => {
    const column = { state: 'state', nonce: 'nonce', verifier: 'verifier' } as const;
    let refused = 0;
    for (const which of Object.values(column)) {
      for (const how of ['swapped', 'missing', 'reused', 'expired'] as const) {
        const [one, other] = [createBrowserLike(), createBrowserLike()];
        const used = await stage.upToCallback(other);
        const callback = await stage.upToCallback(one);
        if (how === 'swapped') await swap(which);
        if (how === 'missing') await stage.pool.query(`update sign_in_attempt set ${which} = ''`);
        if (how === 'reused') {
          await other.get(used);
          await stage.pool.query('delete from session');
          one.setCookie('colophon-sign-in', other.cookie('colophon-sign-in') ?? 'A'.repeat(43));
        }
        if (how === 'expired') stage.pass(601);
        const answer = await one.get(how === 'missing' && which === 'state' ? callback.replace(/state=[^&]*/, '') : callback);
        refused += answer.status === 400 && one.cookie('colophon') === undefined && (await stage.countSessions()) === 0 ? 1 : 0;
        await stage.pool.query('delete from sign_in_attempt');
      }
    }
    expect(refused).toBe(12);
  }, 60_000);

  /** Exchanges one value of the two waiting attempts. */
  async function swap(which: string): Promise<void> {
    const { rowCount } = await stage.pool.query(`update sign_in_attempt a set ${which} = b.${which} from sign_in_attempt b where a.browser_hash <> b.browser_hash`);
    expect(rowCount).toBe(2);
  }

  test('a callback of a browser that began nothing is refused', async () => {
    const callback = await stage.upToCallback(createBrowserLike());
    expect((await createBrowserLike().get(callback)).status).toBe(400);
    expect(await stage.countSessions()).toBe(0);
  });

  test('A-03 the same callback a second time is refused and reported once', async () => {
    const browser = createBrowserLike();
    const callback = await stage.upToCallback(browser);
    const planted = browser.cookie('colophon-sign-in')!;
    await browser.get(callback);
    expect(await stage.countSessions()).toBe(1);
    const thief = createBrowserLike();
    thief.setCookie('colophon-sign-in', planted);
    expect((await thief.get(callback)).status).toBe(400);
    expect(await stage.countSessions()).toBe(1);
    expect(stage.events.filter((event) => event.kind === 'sign-in-refused')).toHaveLength(1);
  });

  test('the identity service itself takes a code once', async () => {
    const browser = createBrowserLike();
    const callback = await stage.upToCallback(browser);
    const { rows } = await stage.pool.query<{ state: string; nonce: string; verifier: string }>('select state, nonce, verifier from sign_in_attempt order by created_at desc limit 1');
    await stage.identity.redeem(new URL(callback), rows[0]!);
    await expect(stage.identity.redeem(new URL(callback), rows[0]!)).rejects.toMatchObject({ error: 'invalid_grant' });
  });
});

describe('B-01 the secret that the browser holds', () => {
  test('a secret planted before sign-in is worth nothing after it', async () => {
    const planted = 'P'.repeat(43);
    const browser = createBrowserLike();
    browser.setCookie('colophon', planted);
    await browser.get(await stage.upToCallback(browser));
    expect(browser.cookie('colophon')).not.toBe(planted);
    const thief = createBrowserLike();
    thief.setCookie('colophon', planted);
    expect((await sessionOf(thief)).status).toBe(401);
  });

  test('a second sign-in of the same browser ends its first session', async () => {
    const browser = await stage.signIn();
    const first = browser.cookie('colophon')!;
    await browser.get((await browser.follow(`${stage.url}/auth/sign-in`)).address);
    const again = createBrowserLike();
    again.setCookie('colophon', first);
    expect((await sessionOf(again)).status).toBe(401);
    expect((await sessionOf(browser)).status).toBe(200);
  });

  test('the tables hold nothing that signs anyone in', async () => {
    const browser = await stage.signIn();
    const secret = browser.cookie('colophon')!;
    const { csrfToken } = (await (await sessionOf(browser)).json()) as { csrfToken: string };
    const { rows } = await stage.pool.query<{ row: string }>('select session::text as row from session');
    expect(rows).toHaveLength(1);
    expect(rows[0]!.row).not.toContain(secret);
    expect(rows[0]!.row).not.toContain(Buffer.from(secret, 'base64url').toString('hex'));
    expect(rows[0]!.row).not.toContain(csrfToken);
  });

  test('B-02 every cookie is http-only, same-site and for the whole host', async () => {
    const browser = createBrowserLike();
    const start = await fetch(`${stage.url}/auth/sign-in`, { redirect: 'manual' });
    const done = await browser.get(await stage.upToCallback(browser));
    const lines = [...start.headers.getSetCookie(), ...done.headers.getSetCookie()];
    expect(lines.length).toBeGreaterThanOrEqual(3);
    for (const line of lines) expect(line).toMatch(/; Path=\/;.*HttpOnly; SameSite=Lax/);
  });
});

test('signing out ends the session at once and leads to the identity service, which forgets the person', async () => {
  const browser = await stage.signIn();
  const secret = browser.cookie('colophon')!;
  const { csrfToken } = (await (await sessionOf(browser)).json()) as { csrfToken: string };
  const answer = await fetch(`${stage.url}/api/session`, { method: 'DELETE', headers: { Cookie: `colophon=${secret}`, Origin: stage.url, 'X-Colophon-Token': csrfToken } });
  const { next } = (await answer.json()) as { next: string };
  expect((await sessionOf(browser)).status).toBe(401);
  const page = await (await browser.follow(next)).response.text();
  const xsrf = /name="xsrf" value="([^"]+)"/.exec(page)?.[1] ?? '';
  const action = /action="([^"]+)"/.exec(page)?.[1] ?? '';
  const out = await browser.post(action, { xsrf, logout: 'yes' });
  expect(out.headers.get('Location')).toBe(`${stage.url}/auth/signed-out`);
  const anew = await browser.follow(`${stage.url}/auth/sign-in`);
  expect(await anew.response.text()).toContain('Who is signing in?');
});
