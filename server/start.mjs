/** `npm start`: makes a bare checkout run, on plain Node.js without a package. Each step says what it did and how long it took. */
import { existsSync, readFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildClient } from './set-up/client.mjs';
import { makeDataFolder } from './set-up/data-folder.mjs';
import { openProductDatabase } from './set-up/database.mjs';
import { live } from './set-up/lifetime.mjs';
import { ensurePackages } from './set-up/packages.mjs';
import { choosePort } from './set-up/port.mjs';
import { buildServer } from './set-up/server-bundle.mjs';
import { startServer } from './set-up/server-process.mjs';
import { secondsSince, step } from './set-up/steps.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const dataFolder = resolve(process.env.PICKGLASS_DATA || join(root, '.pickglass'));
const started = performance.now();

/** @param {import('./set-up/lifetime.mjs').Lifetime} life */
async function start({ signal, atEnd, fail }) {
  const host = process.env.HOST || '127.0.0.1';
  const { port, note } = await choosePort(process.env.PORT, host);
  if (note !== undefined) console.log(note);
  makeDataFolder(dataFolder);

  await step('packages', () => ensurePackages(root, signal));
  const program = await step('server', () => buildServer(root));
  await step('client', () => buildClient(root, signal));
  const database = await step('database', () => openProductDatabase(dataFolder));
  atEnd(database.leave);

  const server = startServer(program, {
    dataFolder,
    env: { NODE_ENV: 'production', DATABASE_URL: database.url, PICKGLASS_DATA: dataFolder, PORT: String(port), HOST: host },
    onStep: (text, milliseconds) => console.log(`${''.padEnd(12)} ${text} (${(milliseconds / 1000).toFixed(1)} s)`),
  });
  atEnd(server.stop);
  const accountsFile = await server.ready;
  server.ended.then(() => fail(`The server ended by itself. Its log: ${server.logFile}`), fail);

  console.log(`started in ${secondsSince(started)}; log: ${server.logFile}; Ctrl-C stops everything`);
  console.log(`Pickglass ready: http://${isEveryAddress(host) ? '127.0.0.1' : host}:${port}`);
  printAccounts(accountsFile);
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

await live(start);
