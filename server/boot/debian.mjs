/** Installing what is missing from Debian, as root or through sudo, or saying what to install. */
import { follow, run } from './run.mjs';
import { Stop } from './say.mjs';

/** @param {string} name */
export function hasPackage(name) {
  return run('dpkg-query', ['-W', '-f', '${db:Status-Status}', name]).out === 'installed';
}

/** Installs Debian packages that are not there yet.
 * @param {readonly string[]} names
 * @param {string} why what they are for, for the reader
 * @param {(line: string) => void} say */
export async function requirePackages(names, why, say) {
  const missing = names.filter((name) => !hasPackage(name));
  if (missing.length === 0) return;
  const order = `apt-get install -y --no-install-recommends ${missing.join(' ')}`;
  const command = rootCommand();
  if (run('apt-get', ['--version']).missing) throw new Stop(`${why} is missing, and this is no Debian system. Install the like of these packages and start again: ${missing.join(', ')}.`);
  if (!command) throw new Stop(`${why} is missing, and this account may not install it. Run this once as root, then start again:\n  apt-get update && ${order}`);
  say(`Installing ${why} from Debian (${missing.join(', ')}).`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  // Finishes what an installation that was cut off has left half done; does nothing otherwise.
  await follow(command[0] ?? 'dpkg', [...command.slice(1), ...(command.length > 0 ? ['dpkg'] : []), '--configure', '-a'], { env });
  await aptGet(command, ['update'], env, order);
  await aptGet(command, order.split(' ').slice(1), env, order);
}

/** @returns {readonly string[] | undefined} what to put before a command that needs root */
function rootCommand() {
  if (process.getuid?.() === 0) return [];
  return run('sudo', ['-n', 'true']).ok ? ['sudo', '-n', '--preserve-env=DEBIAN_FRONTEND'] : undefined;
}

/** @param {readonly string[]} before @param {readonly string[]} args @param {NodeJS.ProcessEnv} env @param {string} order */
async function aptGet(before, args, env, order) {
  const [program = '', ...rest] = [...before, 'apt-get', '-q', '-o', 'DPkg::Lock::Timeout=120', ...args];
  const { status, tail } = await follow(program, rest, { env });
  if (status === 0) return;
  if (/Temporary failure resolving|Could not resolve|Could not connect|Unable to connect/.test(tail)) throw new Stop(`Debian's package server was not reached. Check the network and start again, or install by hand: ${order}`);
  const words = tail.trim().split('\n').slice(-4).join('\n  ');
  if (/No space left|not have enough free space/.test(tail)) throw new Stop(`The disk is full while installing from Debian. Free about 1 GB and start again.\n  ${words}`);
  throw new Stop(`Debian's package manager could not finish. Look at its words, put that right, and start again, or install by hand: ${order}\n  ${words}`);
}
