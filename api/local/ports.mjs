// Ports on loopback, in plain Node: this runs before any package is installed.
import { createServer } from 'node:net';

/**
 * Whether `port` can be listened on.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
function isFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

/**
 * The first port from `wanted` on that nobody listens on, leaving out those in `taken`.
 * @param {number} wanted
 * @param {ReadonlySet<number>} [taken]
 * @returns {Promise<number>}
 */
export async function nextFreePort(wanted, taken = new Set()) {
  for (let port = wanted; port < 65_536; port += 1) {
    if (!taken.has(port) && (await isFree(port))) return port;
  }
  throw new Error(`no port from ${wanted} on is free`);
}

/**
 * A port that the system chooses.
 * @returns {Promise<number>}
 */
export function anyFreePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = /** @type {import('node:net').AddressInfo} */ (probe.address());
      probe.close(() => resolve(port));
    });
  });
}
