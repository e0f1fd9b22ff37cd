/** The database of the product: the one that DATABASE_URL names, or a private cluster in the data folder. */
import { join } from 'node:path';
import { openCluster } from '../../db/cluster.mjs';
import { findOrInstallPostgres, reachableFolder } from './postgres.mjs';

const name = 'pickglass';

/**
 * @param {string} dataFolder
 * @returns {Promise<{ note: string, result: { url: string, leave: () => Promise<void> } }>}
 */
export async function openProductDatabase(dataFolder) {
  const given = process.env.DATABASE_URL;
  if (given) return { note: 'the one of DATABASE_URL', result: { url: given, leave: async () => undefined } };
  const { bin, installed } = await findOrInstallPostgres();
  const wanted = join(dataFolder, 'postgres');
  const folder = await reachableFolder(wanted);
  const cluster = await openCluster({ bin, folder });
  await cluster.ensureDatabase(name);
  const notes = [`on 127.0.0.1:${cluster.port}`];
  if (installed) notes.unshift("Debian's package installed");
  if (folder !== wanted) notes.push(`in ${folder}, because the user postgres cannot reach ${dataFolder}`);
  return { note: notes.join(', '), result: { url: cluster.url(name), leave: cluster.leave } };
}
