/** Where PostgreSQL's programs are on this machine, and under which account they run. */
import { accessSync, constants, existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

/** The oldest release that has everything the migrations use (security_invoker views). */
export const OLDEST = 15;

/** @typedef {{ version: number, bin: string }} Postgres */

/** The newest PostgreSQL of 15 or later. Debian is asked by package, other systems by PATH.
 * @returns {Postgres | undefined} */
export function findPostgres() {
  const found = [...fromPackages(), ...fromPath()].filter((each) => each.version >= OLDEST);
  return found.sort((a, b) => b.version - a.version)[0];
}

function fromPackages() {
  const listed = run('dpkg-query', ['-W', '-f', '${Package} ${db:Status-Status}\\n', 'postgresql-[0-9]*']);
  const names = listed.out.split('\n').flatMap((line) => {
    const match = /^(postgresql-\d+) installed$/.exec(line);
    return match ? [match[1]] : [];
  });
  return names.flatMap((name) => {
    const files = run('dpkg', ['-L', name]).out.split('\n');
    const initdb = files.find((file) => file.endsWith('/bin/initdb') && existsSync(file));
    return initdb ? [{ version: Number(name.slice('postgresql-'.length)), bin: dirname(initdb) }] : [];
  });
}

function fromPath() {
  return (process.env['PATH'] ?? '').split(':').filter((folder) => folder !== '' && isProgram(join(folder, 'initdb')) && isProgram(join(folder, 'postgres'))).flatMap((bin) => {
    const match = /\(PostgreSQL\) (\d+)/.exec(run(join(bin, 'postgres'), ['--version']).out);
    return match ? [{ version: Number(match[1]), bin }] : [];
  });
}

/** @param {string} file */
function isProgram(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** @typedef {{ uid?: number, gid?: number }} Account */

/** The account PostgreSQL runs under: ours, or `postgres` when we are root (it refuses root).
 * @returns {Account} empty: our own account */
export function postgresAccount() {
  if (process.getuid?.() !== 0) return {};
  const uid = run('id', ['-u', 'postgres']);
  const gid = run('id', ['-g', 'postgres']);
  if (!uid.ok || !gid.ok) {
    throw new Stop('PostgreSQL does not run as root, and this machine has no account named postgres. Install Debian\'s package postgresql, or start as an ordinary account.');
  }
  return { uid: Number(uid.out.trim()), gid: Number(gid.out.trim()) };
}

/** May that account walk into this folder? Its parents count too.
 * @param {string} folder @param {Account} account */
export function canEnter(folder, account) {
  if (account.uid === undefined) return true;
  return run('test', ['-d', folder, '-a', '-x', folder], { ...account, cwd: '/' }).ok;
}
