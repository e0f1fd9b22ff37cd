/**
 * Before the tests of the server: a throw-away cluster for a run by hand. `npm test` brings its own, and names it in
 * TEST_DATABASE_URL.
 */
import { tmpdir, userInfo } from 'node:os';
import { join } from 'node:path';
import { openCluster } from '../../db/cluster.mjs';
import { findOrInstallPostgres } from '../../server/set-up/postgres.mjs';
import { keepCluster } from './kept-cluster.mjs';

export default async function startDatabase() {
  if (process.env.TEST_DATABASE_URL !== undefined) return;
  const { bin } = await findOrInstallPostgres();
  const folder = join(tmpdir(), `pickglass-test-database-${userInfo().uid}`);
  const cluster = await openCluster({ bin, folder, durable: false });
  keepCluster(cluster);
  process.env.TEST_DATABASE_URL = cluster.url('postgres');
}
