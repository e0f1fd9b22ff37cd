/** The packages of the lock file: installed when they are missing or not the locked versions, left alone when they are right. */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';

/** @typedef {Record<string, { version?: string, link?: boolean, optional?: boolean, peer?: boolean }>} LockedPackages */

/**
 * Makes node_modules what package-lock.json says.
 * @param {string} root
 * @param {AbortSignal} signal
 * @returns {Promise<{ note: string, result: undefined }>}
 */
export async function ensurePackages(root, signal) {
  if (arePackagesRight(root)) return { note: 'as the lock file says', result: undefined };
  // A production environment would leave out the packages that build the client.
  await runCommand('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], { cwd: root, signal });
  return { note: 'installed from the lock file', result: undefined };
}

/**
 * npm writes what it installed to node_modules/.package-lock.json, last of all: an interrupted installation has no such file.
 * @param {string} root
 */
function arePackagesRight(root) {
  const installedFile = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(installedFile)) return false;
  const installed = readPackages(installedFile);
  return Object.entries(readPackages(join(root, 'package-lock.json'))).every(([path, locked]) => {
    if (!path.startsWith('node_modules/') || locked.link) return true;
    const found = installed[path];
    // Optional packages are those of other systems.
    return found === undefined ? locked.optional === true : found.version === locked.version;
  });
}

/**
 * @param {string} lockFile
 * @returns {LockedPackages}
 */
const readPackages = (lockFile) => JSON.parse(readFileSync(lockFile, 'utf8')).packages;
