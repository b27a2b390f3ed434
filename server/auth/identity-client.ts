import * as openid from 'openid-client';
import { z } from 'zod';

/** How the identity service is reached and what it is trusted for; fixed at start. */
export interface IdentitySettings {
  readonly issuer: URL;
  readonly clientId: string;
  readonly clientSecret: string;
  /** The one signature that an ID token may carry. */
  readonly signingAlg: 'RS256' | 'PS256' | 'ES256' | 'EdDSA';
  /** Plain http; the configuration allows it on loopback outside production only. */
  readonly allowHttp: boolean;
  readonly publicUrl: URL;
}

/** The three values that tie an answer to the browser that asked. */
export interface AttemptSecrets {
  readonly state: string;
  readonly nonce: string;
  readonly verifier: string;
}

/** Who the identity service says this is. */
export interface Identity {
  readonly issuer: string;
  readonly subject: string;
  readonly name: string;
  readonly email: string;
  /** When the person last gave their proof there. */
  readonly authTime: Date;
}

export interface IdentityClient {
  newAttempt(): AttemptSecrets;
  /** Where to send the browser. @param options.fresh asks for a new proof even from someone signed in there */
  signInUrl(attempt: AttemptSecrets, options?: { readonly fresh?: boolean }): Promise<URL>;
  /** Exchanges the code of a callback address and checks everything in the answer. @throws when anything does not fit */
  redeem(callback: URL, attempt: AttemptSecrets): Promise<Identity>;
  /** Where a browser ends its session at the identity service; undefined when that has no such page. */
  signOutUrl(): Promise<URL | undefined>;
}

/** A proof older than this is asked for again, whatever the identity service remembers. */
const OLDEST_PROOF_SECONDS = 12 * 3600;

const profile = z.object({ name: z.string().trim().min(1).max(255), email: z.string().trim().min(3).max(255) });

/** The product's side of OpenID Connect: authorization code with PKCE (S256), nothing else. */
export function createIdentityClient(settings: IdentitySettings): IdentityClient {
  const configuration = rememberSuccess(() => discover(settings));
  const redirectUri = new URL('/auth/callback', settings.publicUrl).href;
  return {
    newAttempt: () => ({ state: openid.randomState(), nonce: openid.randomNonce(), verifier: openid.randomPKCECodeVerifier() }),
    signInUrl: async ({ state, nonce, verifier }, { fresh = false } = {}) =>
      openid.buildAuthorizationUrl(await configuration(), {
        redirect_uri: redirectUri,
        response_type: 'code',
        scope: 'openid profile email',
        state,
        nonce,
        code_challenge: await openid.calculatePKCECodeChallenge(verifier),
        code_challenge_method: 'S256',
        max_age: String(OLDEST_PROOF_SECONDS),
        ...(fresh ? { prompt: 'login' } : {}),
      }),
    redeem: async (callback, attempt) => redeem(await configuration(), callback, attempt),
    signOutUrl: async () => {
      const known = await configuration();
      if (known.serverMetadata().end_session_endpoint === undefined) return undefined;
      return openid.buildEndSessionUrl(known, { client_id: settings.clientId, post_logout_redirect_uri: new URL('/auth/signed-out', settings.publicUrl).href });
    },
  };
}

function discover(settings: IdentitySettings): Promise<openid.Configuration> {
  return openid.discovery(
    settings.issuer,
    settings.clientId,
    { id_token_signed_response_alg: settings.signingAlg },
    openid.ClientSecretBasic(settings.clientSecret),
    { timeout: 10, ...(settings.allowHttp ? { execute: [openid.allowInsecureRequests] } : {}) },
  );
}

async function redeem(configuration: openid.Configuration, callback: URL, attempt: AttemptSecrets): Promise<Identity> {
  const tokens = await openid.authorizationCodeGrant(configuration, callback, {
    expectedState: attempt.state,
    expectedNonce: attempt.nonce,
    pkceCodeVerifier: attempt.verifier,
    maxAge: OLDEST_PROOF_SECONDS,
    idTokenExpected: true,
  });
  const claims = tokens.claims();
  if (claims?.auth_time === undefined) throw new Error('the ID token does not say when the person signed in');
  const told = profile.safeParse(claims);
  // Many services put the name into their user information only.
  const { name, email } = told.success ? told.data : profile.parse(await openid.fetchUserInfo(configuration, tokens.access_token, claims.sub));
  return { issuer: claims.iss, subject: claims.sub, name, email, authTime: new Date(claims.auth_time * 1000) };
}

/** Asks once and keeps the answer; a failure is forgotten, so that the next caller tries again. */
function rememberSuccess<T>(ask: () => Promise<T>): () => Promise<T> {
  let known: Promise<T> | undefined;
  return () => {
    known ??= ask().catch((error: unknown) => {
      known = undefined;
      throw error;
    });
    return known;
  };
}
