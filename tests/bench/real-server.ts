/** The production server with a database and a data folder of its own, for figures that are measured over HTTP. */
import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { freePort, openCluster } from '../../db/cluster.mjs';
import { temporaryDataFolder } from '../../server/set-up/data-folder.mjs';
import { findOrInstallPostgres } from '../../server/set-up/postgres.mjs';
import { buildServer } from '../../server/set-up/server-bundle.mjs';
import { startServer } from '../../server/set-up/server-process.mjs';

const root = join(__dirname, '..', '..');
const accountsSchema = z.array(z.object({ email: z.string(), password: z.string() }));

export interface RealServer {
  readonly origin: string;
  readonly processId: number;
  /** The first demo account is signed in. */
  readonly cookie: string;
}

/** Runs `work` against a server that is stopped afterwards, and leaves nothing behind. */
export async function withRealServer<Result>(work: (server: RealServer) => Promise<Result>): Promise<Result> {
  const folder = temporaryDataFolder('bench');
  const { bin } = await findOrInstallPostgres();
  const cluster = await openCluster({ bin, folder: join(folder, 'postgres') });
  await cluster.ensureDatabase('pickglass');
  const { result: program } = await buildServer(root);
  const port = await freePort();
  const env = { NODE_ENV: 'production', DATABASE_URL: cluster.url('pickglass'), PICKGLASS_DATA: folder, PORT: String(port) };
  const server = startServer(program, { dataFolder: folder, env, onStep: () => undefined });
  try {
    const accountsFile = await server.ready;
    const origin = `http://127.0.0.1:${port}`;
    return await work({ origin, processId: server.processId, cookie: await signIn(origin, accountsFile) });
  } finally {
    await server.stop();
    await cluster.leave();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function signIn(origin: string, accountsFile: string): Promise<string> {
  const [account] = accountsSchema.parse(JSON.parse(readFileSync(accountsFile, 'utf8')));
  const response = await fetch(`${origin}/api/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: account?.email, password: account?.password }),
  });
  return response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');
}
