/** Free ports on loopback. */
import { createServer } from 'node:net';

/** Can this port be listened on now?
 * @param {number} port 0 asks the system for one
 * @param {string} [host]
 * @returns {Promise<number>} the port, or 0 when it is taken or not ours to use */
function tryPort(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(0));
    probe.listen({ port, host, exclusive: true }, () => {
      const address = probe.address();
      probe.close(() => resolve(address && typeof address === 'object' ? address.port : 0));
    });
  });
}

/** The wanted port if it is free, else another free one.
 * @param {number | undefined} wanted
 * @returns {Promise<number>} */
export async function freePort(wanted) {
  if (wanted) {
    const got = await tryPort(wanted);
    if (got) return got;
  }
  return tryPort(0);
}

/** The first free port from `first` upwards, so that the address stays easy to remember.
 * @param {number} first @param {number} [tries] */
export async function nextFreePort(first, tries = 50) {
  for (let port = first; port < first + tries; port += 1) {
    if (await tryPort(port)) return port;
  }
  return tryPort(0);
}

/** @param {number} port @param {string} [host] address that will listen on it */
export async function isFree(port, host) {
  return (await tryPort(port, host)) === port;
}
