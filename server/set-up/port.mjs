/** The port to serve on: the one that PORT names, or 8787, or, when that is taken, any free one. */
import { createServer } from 'node:net';
import { freePort } from '../../db/cluster.mjs';
import { SetUpError } from './run-command.mjs';

const usualPort = 8787;

/**
 * @param {string | undefined} wanted What PORT says.
 * @param {string} host
 * @returns {Promise<{ port: number, note: string | undefined }>}
 */
export async function choosePort(wanted, host) {
  if (!wanted) {
    if (await isFree(usualPort, host)) return { port: usualPort, note: undefined };
    return { port: await freePort(), note: `Port ${usualPort} is taken by another program; taking a free one.` };
  }
  const port = Number(wanted);
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new SetUpError(`PORT must be a whole number from 0 to 65535, got ${wanted}`);
  }
  if (port === 0) return { port: await freePort(), note: undefined };
  if (await isFree(port, host)) return { port, note: undefined };
  throw new SetUpError(`Port ${port} is taken by another program. Stop it, or name another port: PORT=${port + 1} npm start`);
}

/**
 * @param {number} port
 * @param {string} host
 * @returns {Promise<boolean>}
 */
function isFree(port, host) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, host, () => probe.close(() => resolve(true)));
  });
}
