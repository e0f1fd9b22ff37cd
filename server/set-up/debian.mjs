/** Debian packages: installed by ourselves only when we are root on a system that has apt-get; otherwise the command is named. */
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { runCommand, SetUpError } from './run-command.mjs';

/**
 * The full path of a program of the PATH, or undefined.
 * @param {string} name
 */
export function findProgram(name) {
  return (process.env.PATH ?? '')
    .split(delimiter)
    .map((/** @type {string} */ folder) => join(folder, name))
    .find(isExecutable);
}

/** @param {string} path */
export function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * Installs a Debian package, or throws a SetUpError that names the one command to run.
 * @param {string} name
 * @param {string} what What is missing, as people call it.
 */
export async function installDebianPackage(name, what) {
  const command = `apt-get install -y --no-install-recommends ${name}`;
  if (process.getuid?.() !== 0 || findProgram('apt-get') === undefined) {
    throw new SetUpError(`${what} is missing. As root: ${command}`);
  }
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  await runCommand('apt-get', ['update', '-qq'], { env });
  await runCommand('apt-get', ['install', '-y', '-qq', '--no-install-recommends', name], { env });
}
