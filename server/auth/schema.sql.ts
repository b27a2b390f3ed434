/**
 * Tables of sign-in, for a migration to run in order as the database's owner,
 * after the tables `person (id uuid primary key, issuer text, subject text,
 * name text, email text, created_at timestamptz, unique (issuer, subject))`
 * and `house (id uuid primary key)`. They hold no house's records, so they
 * stand outside its wall: only the sign-in room reads them.
 */
export const AUTH_TABLES: readonly string[] = [
  // Only hashes of what the browser holds: a copy of these tables signs nobody in.
  `create table session (
     id uuid primary key,
     token_hash bytea not null unique check (octet_length(token_hash) = 32),
     person_id uuid not null references person (id) on delete cascade,
     house_id uuid not null references house (id) on delete cascade,
     created_at timestamptz not null,
     last_seen_at timestamptz not null,
     auth_time timestamptz not null,
     browser text not null check (length(browser) <= 300))`,
  'create index session_person on session (person_id)',
  'create index session_last_seen on session (last_seen_at)',
  `create table sign_in_attempt (
     browser_hash bytea primary key check (octet_length(browser_hash) = 32),
     state text not null,
     nonce text not null,
     verifier text not null,
     next text not null,
     created_at timestamptz not null)`,
  'create index sign_in_attempt_created on sign_in_attempt (created_at)',
];
