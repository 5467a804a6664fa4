import { createServer } from 'node:net';
import { Trouble, say } from './say.mjs';

/** @param {number} port @param {string} host @returns {Promise<boolean>} */
function canListen(port, host) {
  return new Promise((resolve) => {
    const server = createServer();
    // A machine without IPv6 has nothing there that could stand in the way.
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) =>
      resolve(error.code !== 'EADDRINUSE' && error.code !== 'EACCES'),
    );
    server.listen({ port, host }, () => server.close(() => resolve(true)));
  });
}

/** Both loopbacks must be free: a browser asks ::1 for localhost first. @param {number} port */
export const isFree = async (port) => (await canListen(port, '127.0.0.1')) && (await canListen(port, '::1'));

/**
 * The first free port from `first` on.
 * @param {string} what is said when the first choice is taken
 * @param {number} first
 * @param {number[]} [given] ports already promised to others
 */
export async function freePort(what, first, given = []) {
  for (let port = first; port < first + 100 && port < 65_536; port += 1) {
    if (given.includes(port)) continue;
    if (await isFree(port)) {
      if (port !== first) say(`  port ${first} is taken: ${what} uses ${port}`);
      return port;
    }
  }
  throw new Trouble(`No free port for ${what} from ${first} on: end what uses them and start again.`);
}
