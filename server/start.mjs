/**
 * `npm start`: makes a bare checkout run, on plain Node.js without a package. Each step says what it did and how long it took; what
 * was started is stopped again, in reverse order, on Ctrl-C, on SIGTERM and when a step fails.
 */
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildClient } from './set-up/client.mjs';
import { openProductDatabase } from './set-up/database.mjs';
import { ensurePackages } from './set-up/packages.mjs';
import { choosePort } from './set-up/port.mjs';
import { SetUpError } from './set-up/run-command.mjs';
import { buildServer } from './set-up/server-bundle.mjs';
import { startServer } from './set-up/server-process.mjs';
import { secondsSince, step } from './set-up/steps.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const dataFolder = resolve(process.env.PICKGLASS_DATA || join(root, '.pickglass'));
const started = performance.now();
const interrupted = new AbortController();
/** @type {(() => Promise<void>)[]} */
const undo = [];
/** @type {Promise<void> | undefined} */
let stopping;

/** @param {number} code */
function stop(code) {
  stopping ??= (async () => {
    interrupted.abort();
    for (const close of undo.reverse()) await close();
    process.exit(code);
  })();
  return stopping;
}

async function start() {
  const host = process.env.HOST || '127.0.0.1';
  const { port, note } = await choosePort(process.env.PORT, host);
  if (note !== undefined) console.log(note);
  // Open to pass through, because PostgreSQL runs as another user when we are root; what lies in it is closed.
  mkdirSync(dataFolder, { recursive: true, mode: process.getuid?.() === 0 ? 0o711 : 0o700 });

  await step('packages', () => ensurePackages(root, interrupted.signal));
  const program = await step('server', () => buildServer(root));
  await step('client', () => buildClient(root, interrupted.signal));
  const database = await step('database', () => openProductDatabase(dataFolder));
  undo.push(database.leave);

  const server = await startServer(program, {
    dataFolder,
    env: { NODE_ENV: 'production', DATABASE_URL: database.url, PICKGLASS_DATA: dataFolder, PORT: String(port), HOST: host },
    onStep: (text, milliseconds) => console.log(`${''.padEnd(12)} ${text} (${(milliseconds / 1000).toFixed(1)} s)`),
  });
  undo.push(server.stop);
  server.ended.then(async () => {
    if (stopping === undefined) console.error(`The server ended by itself. Its log: ${server.logFile}`);
    await stop(1);
  }, fail);

  console.log(`started in ${secondsSince(started)}; log: ${server.logFile}; Ctrl-C stops everything`);
  console.log(`Pickglass ready: http://${isEveryAddress(host) ? '127.0.0.1' : host}:${port}`);
  printAccounts(server.accountsFile);
}

/** @param {string} host */
const isEveryAddress = (host) => ['0.0.0.0', '::', 'localhost'].includes(host);

/**
 * The accounts of the demo department; a database that was filled by others has none.
 * @param {string} file
 */
function printAccounts(file) {
  if (!existsSync(file)) return;
  for (const { role, email, password } of JSON.parse(readFileSync(file, 'utf8'))) {
    console.log(`demo account: ${role} ${email} ${password}`);
  }
}

/** @param {unknown} error */
function fail(error) {
  if (stopping !== undefined) return stopping;
  console.error(error instanceof SetUpError ? error.message : error);
  return stop(1);
}

process.on('SIGINT', () => void stop(0));
process.on('SIGTERM', () => void stop(0));
process.on('SIGHUP', () => void stop(0));
await start().catch(fail);
