import { createHash, generateKeyPairSync, randomBytes, timingSafeEqual } from 'node:crypto';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { Provider, type Configuration, type KoaContextWithOIDC } from 'oidc-provider';
import { renderPage, sendPage } from '#server/auth/page.ts';
import { choosePage, lostPage, passwordPage, SUBMIT, signOutPage, type KnownPerson } from './identity-pages.ts';
import { createIdentityStore } from './identity-store.ts';
import { close, listen, type LocalService } from './listen.ts';

export interface IdentityOptions {
  /** 0 takes any free port. */
  readonly port: number;
  readonly people: readonly KnownPerson[];
  readonly clientId: string;
  readonly clientSecret: string;
  /** Where the product's pages are reached: the only place that codes are sent to. */
  readonly publicUrl: URL;
}

const SCOPE = 'openid profile email';

/**
 * The identity service of a local start and of tests: a real OpenID provider
 * on loopback with invented people. It is no part of a production start.
 */
export async function startIdentity(options: IdentityOptions): Promise<LocalService> {
  let handle: (req: IncomingMessage, res: ServerResponse) => void = (_req, res) => void res.writeHead(503).end();
  const server = createServer((req, res) => handle(req, res));
  const { port } = await listen(server, options.port);
  const issuer = `http://127.0.0.1:${String(port)}`;
  const provider: Provider = new Provider(issuer, configure(options, () => provider));
  const protocol = provider.callback();
  handle = (req, res) => {
    const uid = /^\/sign-in\/([\w-]+)$/.exec(req.url ?? '')?.[1];
    if (uid === undefined) void protocol(req, res);
    else interact({ provider, options, issuer }, uid, req, res).catch(() => sendPage(res, 400, lostPage()));
  };
  return { url: issuer, stop: () => close(server) };
}

function configure(options: IdentityOptions, provider: () => Provider): Configuration {
  const { privateKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
  const hour = 3600;
  return {
    adapter: createIdentityStore(),
    clients: [
      {
        client_id: options.clientId,
        client_secret: options.clientSecret,
        redirect_uris: [new URL('/auth/callback', options.publicUrl).href],
        post_logout_redirect_uris: [new URL('/auth/signed-out', options.publicUrl).href],
        grant_types: ['authorization_code'],
        response_types: ['code'],
        token_endpoint_auth_method: 'client_secret_basic',
        id_token_signed_response_alg: 'RS256',
      },
    ],
    jwks: { keys: [{ ...privateKey.export({ format: 'jwk' }), kid: randomBytes(8).toString('hex'), use: 'sig', alg: 'RS256' }] },
    cookies: { keys: [randomBytes(32).toString('base64url')], names: { session: 'local-identity', interaction: 'local-identity-step', resume: 'local-identity-resume' } },
    claims: { openid: ['sub'], profile: ['name'], email: ['email', 'email_verified'] },
    conformIdTokenClaims: false,
    responseTypes: ['code'],
    pkce: { required: () => true },
    features: {
      devInteractions: { enabled: false },
      rpInitiatedLogout: { enabled: true, logoutSource: showSignOut(options.publicUrl), postLogoutSuccessSource: showSignedOut },
    },
    interactions: { url: (_ctx, interaction) => `/sign-in/${interaction.uid}` },
    ttl: { AccessToken: 600, AuthorizationCode: 60, IdToken: 600, Grant: 12 * hour, Interaction: 600, Session: 12 * hour },
    findAccount: (_ctx, id) => {
      const person = options.people.find((each) => each.id === id);
      return person && { accountId: id, claims: async () => ({ sub: id, name: person.name, email: person.email, email_verified: true }) };
    },
    // The people are invented, so there is nothing to ask their consent for.
    loadExistingGrant: async (ctx) => {
      const { client, session } = ctx.oidc;
      if (!client || session?.accountId === undefined) return undefined;
      const known = session.grantIdFor(client.clientId);
      const found = known === undefined ? undefined : await provider().Grant.find(known);
      if (found) return found;
      const grant = new (provider().Grant)({ clientId: client.clientId, accountId: session.accountId });
      grant.addOIDCScope(SCOPE);
      await grant.save();
      return grant;
    },
    renderError: (ctx, out) => {
      ctx.type = 'html';
      ctx.body = renderPage('The sign-in cannot go on', `<p>The request was refused (${out.error.replace(/[^\w]/g, ' ')}). Go back to Colophon and sign in again.</p>`);
    },
  };
}

interface Service {
  readonly provider: Provider;
  readonly options: IdentityOptions;
  readonly issuer: string;
}

async function interact({ provider, options, issuer }: Service, uid: string, req: IncomingMessage, res: ServerResponse): Promise<void> {
  const details = await provider.interactionDetails(req, res);
  if (details.uid !== uid) throw new Error('another sign-in');
  const asksForProof = String(details.params['prompt'] ?? '').split(' ').includes('login');
  // A form's way leads on to the product, which a browser counts as the form's address.
  const formTo = `'self' ${options.publicUrl.origin}`;
  const knownEmail = options.people.find((each) => each.id === details.session?.accountId)?.email ?? '';
  if (req.method !== 'POST') {
    sendPage(res, 200, asksForProof ? passwordPage(uid, knownEmail) : choosePage(uid, options.people), formTo);
    return;
  }
  // Only this page's own forms may choose a person.
  if (req.headers.origin !== issuer) throw new Error('sent from another place');
  const form = await readForm(req);
  const person = asksForProof ? findByPassword(options.people, form.get('email') ?? '', form.get('password') ?? '') : options.people.find((each) => each.id === form.get('person'));
  if (!person) {
    const email = form.get('email') ?? '';
    sendPage(res, 422, passwordPage(uid, email, 'E-mail and password do not fit together.'), formTo);
    return;
  }
  await provider.interactionFinished(req, res, { login: { accountId: person.id } }, { mergeWithLastSubmission: false });
}

/** Does the same work whether or not the person exists. */
function findByPassword(people: readonly KnownPerson[], email: string, password: string): KnownPerson | undefined {
  const person = people.find((each) => each.email === email.trim().toLowerCase());
  const digest = (text: string) => createHash('sha256').update(text).digest();
  const fits = timingSafeEqual(digest(password), digest(person?.password ?? randomBytes(8).toString('hex')));
  return fits ? person : undefined;
}

async function readForm(req: IncomingMessage): Promise<URLSearchParams> {
  let text = '';
  for await (const chunk of req as AsyncIterable<Buffer>) {
    text += chunk.toString('utf8');
    if (text.length > 4096) throw new Error('too long');
  }
  return new URLSearchParams(text);
}

function showSignOut(publicUrl: URL) {
  return (ctx: KoaContextWithOIDC, form: string): void => {
    const hash = createHash('sha256').update(SUBMIT).digest('base64');
    ctx.type = 'html';
    ctx.set('Content-Security-Policy', `default-src 'none'; script-src 'sha256-${hash}'; style-src 'unsafe-inline'; font-src data:; form-action 'self' ${publicUrl.origin}; base-uri 'none'; frame-ancestors 'none'`);
    ctx.body = signOutPage(form);
  };
}

function showSignedOut(ctx: KoaContextWithOIDC): void {
  ctx.type = 'html';
  ctx.body = renderPage('You are signed out', '<p>Close this page, or go back to Colophon.</p>');
}
