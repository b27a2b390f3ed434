/** The packages of the lockfile: installed when they are missing or the lockfile has changed. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { readJson } from './home.mjs';
import { follow } from './run.mjs';
import { Stop } from './say.mjs';
import { inCheckout } from './turn.mjs';

/** @param {string} checkout @param {(line: string) => void} say @param {AbortSignal} [signal] */
export async function requireNodePackages(checkout, say, signal) {
  if (isInstalled(checkout)) return;
  await inCheckout(checkout, say, () => install(checkout, say), signal);
}

/** @param {string} checkout @param {(line: string) => void} say */
async function install(checkout, say) {
  // Another start may have done it while we waited for it.
  if (isInstalled(checkout)) return;
  say('Installing the packages of the lockfile (about half a minute).');
  const { status, tail } = await follow('npm', ['ci', '--ignore-scripts', '--no-audit', '--no-fund'], { cwd: checkout, env: { ...process.env, NODE_ENV: 'development' } });
  if (status === 0 && isInstalled(checkout)) return;
  const words = tail.trim().split('\n').slice(-6).join('\n  ');
  if (/ENOSPC/.test(tail)) throw new Stop('The disk is full while installing packages. Free about 1 GB and start again.');
  if (/EACCES|EPERM/.test(tail)) throw new Stop(`This account may not write to ${checkout}. Start as the owner of that folder.`);
  if (/ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ECONNRESET|ETIMEDOUT|ENETUNREACH/.test(tail)) throw new Stop('The npm registry was not reached. Check the network and start again.');
  throw new Stop(`The packages could not be installed:\n  ${words}`);
}

/** npm writes its own list last of all: when that list fits the lockfile, the install was whole.
 * @param {string} checkout */
export function isInstalled(checkout) {
  const wanted = packagesOf(join(checkout, 'package-lock.json'));
  const present = packagesOf(join(checkout, 'node_modules/.package-lock.json'));
  if (!wanted || !present) return false;
  return Object.entries(wanted).every(([path, each]) => {
    if (path === '' || each.link === true) return true;
    const found = present[path];
    // Packages for other systems are named in the lockfile and left out here.
    if (found === undefined) return each.optional === true;
    return found.version === each.version && existsSync(join(checkout, path));
  });
}

/** @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean, link?: boolean }> | undefined} */
function packagesOf(file) {
  const packages = readJson(file)?.['packages'];
  return packages !== null && typeof packages === 'object' ? /** @type {never} */ (packages) : undefined;
}
