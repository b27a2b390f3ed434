/** The folder where this checkout keeps its database, its secrets and its files. */
import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, renameSync, statfsSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { canEnter, findPostgres, postgresAccount } from './postgres.mjs';
import { Stop } from './say.mjs';

/** The checkout this file belongs to. */
export const CHECKOUT = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

/** `.local` in the checkout; elsewhere when the database's account cannot walk there; `COLOPHON_DATA` decides before both.
 * The folder is made when it is missing.
 * @param {string} [checkout]
 * @param {string} [wanted] */
export function openHome(checkout = CHECKOUT, wanted = process.env['COLOPHON_DATA']) {
  // With a database from elsewhere there may be no account to ask about.
  const account = findPostgres() ? postgresAccount() : {};
  if (wanted) {
    const home = resolve(wanted);
    mkdirSync(home, { recursive: true });
    if (!canEnter(home, account)) {
      throw new Stop(`The account postgres may not walk to ${home}. Choose a folder outside root's home with COLOPHON_DATA, for example /var/lib/colophon.`);
    }
    return home;
  }
  const local = join(checkout, '.local');
  mkdirSync(local, { recursive: true });
  if (canEnter(local, account)) return local;
  const key = createHash('sha256').update(checkout).digest('hex').slice(0, 12);
  const home = join('/var/lib/colophon', key);
  mkdirSync(home, { recursive: true, mode: 0o755 });
  return home;
}

/** Refuses to begin when the disk has too little room.
 * @param {string} folder @param {number} megabytes */
export function requireRoom(folder, megabytes) {
  const disk = statfsSync(folder);
  const free = Math.floor((disk.bavail * disk.bsize) / (1024 * 1024));
  if (free < megabytes) {
    throw new Stop(`The disk that holds ${folder} has ${free} MB free and ${megabytes} MB are needed. Free some space, or set COLOPHON_DATA to a folder on another disk, and start again.`);
  }
}

/** A JSON file, or undefined when it is missing or was cut off half-way.
 * @param {string} file
 * @returns {Record<string, unknown> | undefined} */
export function readJson(file) {
  try {
    const value = JSON.parse(readFileSync(file, 'utf8'));
    return value !== null && typeof value === 'object' ? value : undefined;
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return undefined;
    throw error;
  }
}

/** Writes a JSON file whole or not at all; only this account may read it.
 * @param {string} file @param {unknown} value */
export function writeJson(file, value) {
  const half = `${file}.${process.pid}.half`;
  writeFileSync(half, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600, flush: true });
  renameSync(half, file);
}
