/**
 * `npm run dev`: client and server with reload on one origin. Metro serves the client and passes /api on to the server, which tsx
 * restarts when one of its sources changes. The database is the one of `npm start`. Ctrl-C stops all three.
 */
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { freePort } from '../db/cluster.mjs';
import { copyCanvasKit, expoEnvironment, expoProgram } from './set-up/client.mjs';
import { startCompanion } from './set-up/companion.mjs';
import { makeDataFolder } from './set-up/data-folder.mjs';
import { openProductDatabase } from './set-up/database.mjs';
import { live } from './set-up/lifetime.mjs';
import { ensurePackages } from './set-up/packages.mjs';
import { choosePort } from './set-up/port.mjs';
import { step } from './set-up/steps.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const dataFolder = resolve(process.env.PICKGLASS_DATA || join(root, '.pickglass'));

/** @param {import('./set-up/lifetime.mjs').Lifetime} life */
async function develop({ signal, atEnd, fail }) {
  const { port, note } = await choosePort(process.env.PORT, '127.0.0.1');
  if (note !== undefined) console.log(note);
  makeDataFolder(dataFolder);
  await step('packages', () => ensurePackages(root, signal));
  await copyCanvasKit(root, signal);
  const database = await step('database', () => openProductDatabase(dataFolder));
  atEnd(database.leave);

  const apiPort = await freePort();
  const origin = `http://localhost:${port}`;
  const server = startServer(apiPort, origin, database.url);
  const metro = startMetro(port, apiPort);
  atEnd(server.stop);
  atEnd(metro.stop);
  console.log(`client and server: ${origin}; Ctrl-C stops everything`);
  server.ended.then(() => fail('The server ended by itself.'), fail);
  metro.ended.then(() => fail('Metro ended by itself.'), fail);
}

/**
 * @param {number} port
 * @param {string} publicOrigin
 * @param {string} databaseUrl
 */
function startServer(port, publicOrigin, databaseUrl) {
  const tsx = join(root, 'node_modules', 'tsx', 'dist', 'cli.mjs');
  // The workers are started by name, not imported: tsx is told to watch them.
  const watched = ['--include', 'workers/**/*.ts', '--include', 'recon/**/*.ts'];
  return startCompanion([tsx, 'watch', '--clear-screen=false', ...watched, 'server/index.ts'], {
    cwd: root,
    env: {
      NODE_ENV: 'development',
      DATABASE_URL: databaseUrl,
      PICKGLASS_DATA: dataFolder,
      HOST: '127.0.0.1',
      PORT: String(port),
      PUBLIC_ORIGIN: publicOrigin,
    },
  });
}

/**
 * @param {number} port
 * @param {number} apiPort
 */
function startMetro(port, apiPort) {
  return startCompanion([expoProgram(root), 'start', '--port', String(port), '--host', 'localhost'], {
    cwd: root,
    env: { ...expoEnvironment, NODE_ENV: 'development', BROWSER: 'none', PICKGLASS_API: `http://127.0.0.1:${apiPort}` },
  });
}

await live(develop);
