/** The production server with a database and a data folder of its own, for figures that are measured over HTTP. */
import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { freePort, openCluster } from '../../db/cluster.mjs';
import { roleSchema, type Role } from '../../server/contract/route';
import { temporaryDataFolder } from '../../server/set-up/data-folder.mjs';
import { findOrInstallPostgres } from '../../server/set-up/postgres.mjs';
import { buildServer } from '../../server/set-up/server-bundle.mjs';
import { startServer } from '../../server/set-up/server-process.mjs';

const root = join(__dirname, '..', '..');
const accountsSchema = z.array(z.object({ role: roleSchema, email: z.string(), password: z.string() }));
type Account = z.infer<typeof accountsSchema>[number];

export interface RealServer {
  readonly origin: string;
  readonly processId: number;
  readonly dataFolder: string;
  readonly databaseUrl: string;
  /** The first demo account is signed in. */
  readonly cookie: string;
  /** The cookie of the demo account with this role. */
  cookieOf(role: Role): Promise<string>;
}

/** Runs `work` against a server that is stopped afterwards, and leaves nothing behind. `variables` are added to its environment. */
export async function withRealServer<Result>(
  work: (server: RealServer) => Promise<Result>,
  variables: Record<string, string> = {},
): Promise<Result> {
  const folder = temporaryDataFolder('bench');
  const { bin } = await findOrInstallPostgres();
  const cluster = await openCluster({ bin, folder: join(folder, 'postgres') });
  await cluster.ensureDatabase('pickglass');
  const { result: program } = await buildServer(root);
  const port = await freePort();
  const databaseUrl = cluster.url('pickglass');
  const env = { NODE_ENV: 'production', DATABASE_URL: databaseUrl, PICKGLASS_DATA: folder, PORT: String(port), ...variables };
  const server = startServer(program, { dataFolder: folder, env, onStep: () => undefined });
  try {
    const accounts = accountsSchema.parse(JSON.parse(readFileSync(await server.ready, 'utf8')));
    const origin = `http://127.0.0.1:${port}`;
    const cookieOf = (role: Role) =>
      signIn(
        origin,
        accounts.find((account) => account.role === role),
      );
    const cookie = await signIn(origin, accounts[0]);
    return await work({ origin, processId: server.processId, dataFolder: folder, databaseUrl, cookie, cookieOf });
  } finally {
    await server.stop();
    await cluster.leave();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function signIn(origin: string, account: Account | undefined): Promise<string> {
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
