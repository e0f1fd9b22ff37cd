/** Finds PostgreSQL's programs, or installs Debian's; and picks a folder for the cluster that the database's user can reach. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, realpathSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { findProgram, installDebianPackage, isExecutable } from './debian.mjs';
import { tryCommand } from './run-command.mjs';

const debianFolder = '/usr/lib/postgresql';

/**
 * The folder of initdb and pg_ctl, the newest version first.
 * @returns {Promise<{ bin: string, installed: boolean }>}
 */
export async function findOrInstallPostgres() {
  const found = findPostgres();
  if (found !== undefined) return { bin: found, installed: false };
  await installPostgres();
  const bin = findPostgres();
  if (bin === undefined) throw new Error(`Debian's package postgresql was installed, but left no initdb under ${debianFolder}`);
  return { bin, installed: true };
}

function findPostgres() {
  const versions = existsSync(debianFolder) ? readdirSync(debianFolder) : [];
  const folders = versions.sort((a, b) => Number(b) - Number(a)).map((version) => join(debianFolder, version, 'bin'));
  const debian = folders.find((folder) => isExecutable(join(folder, 'initdb')));
  if (debian !== undefined) return debian;
  const initdb = findProgram('initdb');
  return initdb && dirname(realpathSync(initdb));
}

async function installPostgres() {
  // Debian's package makes and starts a cluster of its own unless told not to.
  const settings = '/etc/postgresql-common/createcluster.d';
  if (process.getuid?.() === 0 && existsSync('/etc/debian_version')) {
    mkdirSync(settings, { recursive: true });
    writeFileSync(join(settings, 'no-main-cluster.conf'), 'create_main_cluster = false\n');
  }
  await installDebianPackage('postgresql', 'PostgreSQL');
}

/**
 * The folder for the cluster: `wanted`, unless we are root and the user `postgres` cannot get there, as in a checkout under a
 * closed home; then one under /var/lib that belongs to this checkout alone.
 * @param {string} wanted
 * @returns {Promise<string>}
 */
export async function reachableFolder(wanted) {
  if (process.getuid?.() !== 0) return wanted;
  mkdirSync(dirname(wanted), { recursive: true, mode: 0o711 });
  const { code } = await tryCommand('runuser', ['-u', 'postgres', '--', 'test', '-x', dirname(wanted)], { cwd: '/' });
  if (code === 0) return wanted;
  const name = createHash('sha256').update(wanted).digest('hex').slice(0, 12);
  const folder = join('/var/lib/pickglass', name);
  mkdirSync(dirname(folder), { recursive: true, mode: 0o711 });
  return folder;
}
