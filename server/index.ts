/**
 * The server process: reads the environment, brings the database up to date, fills an empty one with the demo department, listens,
 * and stops when it is told to. It writes log lines only; a parent that started it with a channel (`fork`) gets a message for
 * each step and one when it serves: `{ kind: 'step', text, milliseconds }`, `{ kind: 'ready', url, accountsFile }`.
 */
import { readFile } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { dirname, join } from 'node:path';
import { performance } from 'node:perf_hooks';
import { fileURLToPath } from 'node:url';
import { openDatabase } from '../db/client';
import { migrateDatabase } from '../db/migrate';
import { openWorkers, workersIn } from '../workers/pool';
import { createApp } from './app';
import { accountsFile } from './demo/accounts';
import { seedDemo } from './demo/seed-demo';
import type { Dependencies } from './dependencies';
import { readEnv, type Env } from './env';
import { openLog } from './log';
import { openDicomNode } from './push/dicom-node';
import { keepSweeping } from './push/retention';
import { openDiskObjects } from './storage/disk-objects';
import { cachedImageValues } from './storage/image-values';
import { identityKey, sessionKey } from './storage/kept-keys';

const here = dirname(fileURLToPath(import.meta.url));
const project = join(here, '..');
// The bundle ends in .mjs and has its workers beside it; the sources have them in the folder next door.
const workerFiles = import.meta.url.endsWith('.mjs') ? workersIn(here, '.mjs') : workersIn(join(project, 'workers'), '.ts');
const stopSeconds = 10;

async function start(): Promise<void> {
  const env = readEnv(process.env);
  const log = openLog(env.logLevel);
  await step('database migrated', () => migrateDatabase(env.databaseUrl, join(project, 'drizzle')));
  const { deps, close } = await openDependencies(env, log);
  await step('demo department ready', () => seedDemo(deps));
  const server = createServer(createApp(deps, { clientFolder: join(project, 'dist') }));
  await listen(server, env);
  const stopPush = await openPush(deps);
  const url = env.publicOrigin ?? `http://${env.host}:${(server.address() as AddressInfo).port}`;
  log.info({ url }, 'ready');
  process.send?.({ kind: 'ready', url, accountsFile: accountsFile(env.dataFolder) });
  const stop = once(() =>
    stopServing(
      server,
      async () => {
        await stopPush();
        await close();
      },
      log,
    ),
  );
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, stop);
  // The parent is gone: nobody would stop this process any more.
  process.once('disconnect', stop);
}

/** What goes on without a request: the node that scanners send to, where it is switched on, and the sweeping of the inboxes. */
async function openPush(deps: Dependencies): Promise<() => Promise<void>> {
  const { dicomNode } = deps.env;
  const node = dicomNode && (await openDicomNode(deps, dicomNode, workerFiles));
  if (node) deps.log.info({ port: node.port }, 'the DICOM node listens');
  const stopSweeping = keepSweeping(deps);
  return async () => {
    await node?.close();
    await stopSweeping();
  };
}

/** `work`, but only the first time. */
function once(work: () => Promise<void>): () => void {
  let begun: Promise<void> | undefined;
  return () => {
    begun ??= work();
  };
}

async function openDependencies(env: Env, log: Dependencies['log']) {
  const database = openDatabase(env.databaseUrl);
  const workers = openWorkers(workerFiles, env.workerThreads);
  const objects = await openDiskObjects(join(env.dataFolder, 'objects'));
  const { version } = JSON.parse(await readFile(join(project, 'package.json'), 'utf8')) as { version: string };
  const deps: Dependencies = {
    ...{ env, log, version, workers, objects, db: database.db, sql: database.sql },
    values: cachedImageValues(objects),
    sessionKey: await sessionKey(env),
    identityKey: await identityKey(env),
  };
  const close = async () => {
    await workers.close();
    await database.close();
  };
  return { deps, close };
}

const listen = (server: Server, { port, host }: Env) =>
  new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, resolve);
  });

/** Lets the requests under way finish, then closes threads and connections. */
async function stopServing(server: Server, close: () => Promise<void>, log: Dependencies['log']): Promise<void> {
  setTimeout(() => server.closeAllConnections(), stopSeconds * 1000).unref();
  await new Promise((resolve) => {
    server.close(resolve);
    server.closeIdleConnections();
  });
  await close();
  log.info('stopped');
  if (process.connected) process.disconnect();
}

async function step(text: string, work: () => Promise<unknown>): Promise<void> {
  const before = performance.now();
  await work();
  process.send?.({ kind: 'step', text, milliseconds: Math.round(performance.now() - before) });
}

start().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
