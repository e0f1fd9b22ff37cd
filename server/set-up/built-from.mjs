/** Builds are remembered by a hash of the sources they were made from, so that an unchanged build is not made again. */
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * Runs `build` unless `folder` was built from the present content of `sources`.
 * @param {{ root: string, folder: string, sources: readonly string[], leaveOut?: readonly string[] }} what Files and folders
 *   under `root`; `leaveOut` are paths below it that a build itself writes.
 * @param {() => Promise<void>} build
 * @returns {Promise<boolean>} whether it was built
 */
export async function buildWhenChanged({ root, folder, sources, leaveOut = [] }, build) {
  const stamp = join(root, folder, '.built-from');
  const hash = hashOf(root, sources, leaveOut);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return false;
  await build();
  writeFileSync(stamp, hash);
  return true;
}

/**
 * @param {string} root
 * @param {readonly string[]} sources
 * @param {readonly string[]} leaveOut
 */
function hashOf(root, sources, leaveOut) {
  const hash = createHash('sha256');
  for (const path of sources.flatMap((source) => filesUnder(root, source)).sort()) {
    if (leaveOut.includes(path)) continue;
    const content = readFileSync(join(root, path));
    // The length keeps the end of one file apart from the beginning of the next.
    hash.update(`${path}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}

/**
 * @param {string} root
 * @param {string} path
 * @returns {string[]}
 */
function filesUnder(root, path) {
  const full = join(root, path);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [path];
  return readdirSync(full).flatMap((name) => filesUnder(root, join(path, name)));
}
