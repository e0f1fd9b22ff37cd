/**
 * From request to last byte: a simulation of one cause on a 256² image of the demo department, image and k-space in the display form,
 * by HTTP from the production server with its database and worker threads. The goal, 12 ms, leaves most of a slider's 55 ms to the screen.
 */
import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { freePort, openCluster } from '../../db/cluster.mjs';
import { displayMediaType } from '../../server/contract/planes';
import { temporaryDataFolder } from '../../server/set-up/data-folder.mjs';
import { findOrInstallPostgres } from '../../server/set-up/postgres.mjs';
import { buildServer } from '../../server/set-up/server-bundle.mjs';
import { startServer } from '../../server/set-up/server-process.mjs';
import { type Figure, medianMs } from './figure';

const root = join(__dirname, '..', '..');
const side = 256;

// What is read of the answers.
const accountsSchema = z.array(z.object({ email: z.string(), password: z.string() }));
const listSchema = z.object({ cases: z.array(z.object({ id: z.string() })) });
const caseSchema = z.object({ images: z.array(z.object({ imageId: z.string() })) });
const imageSchema = z.object({ rows: z.number(), columns: z.number() });

export async function requestFigures(): Promise<Figure[]> {
  const folder = temporaryDataFolder('bench');
  const { bin } = await findOrInstallPostgres();
  const cluster = await openCluster({ bin, folder: join(folder, 'postgres') });
  await cluster.ensureDatabase('pickglass');
  const { result: program } = await buildServer(root);
  const port = await freePort();
  const env = { NODE_ENV: 'production', DATABASE_URL: cluster.url('pickglass'), PICKGLASS_DATA: folder, PORT: String(port) };
  const server = startServer(program, { dataFolder: folder, env, onStep: () => undefined });
  try {
    const accounts = await server.ready;
    return [await measure(`http://127.0.0.1:${port}`, accounts)];
  } finally {
    await server.stop();
    await cluster.leave();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function measure(origin: string, accountsFile: string): Promise<Figure> {
  const headers = { 'Content-Type': 'application/json', Cookie: await signIn(origin, accountsFile), Accept: displayMediaType };
  const imageId = await findImage(origin, headers);
  let call = 0;
  const request = async () => {
    const steps = [{ cause: 'periodic-motion', parameters: { phaseSwing: 0.2 + (call++ % 50) / 100 } }];
    const recipe = { steps, reconstruction: { method: 'zero-filled' }, seed: 1 };
    const body = JSON.stringify({ imageId, recipe, outputs: ['image', 'kspaceOfImage'], facts: { phaseEncode: 'column' } });
    const response = await fetch(`${origin}/api/simulations`, { method: 'POST', headers, body });
    if (!response.ok) throw new Error(`the simulation was answered with ${response.status}: ${await response.text()}`);
    await response.arrayBuffer();
  };
  const value = await medianMs(request, { calls: 60, warmUp: 20 });
  return {
    id: `request-simulation-${side}`,
    value,
    unit: 'ms',
    goal: 12,
    better: 'lower',
    note: 'image and k-space, display form, loopback',
  };
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

/** An image of the demo department with the side that the figure names. */
async function findImage(origin: string, headers: Record<string, string>): Promise<string> {
  const ask = async (path: string): Promise<unknown> => {
    const response = await fetch(`${origin}${path}`, { headers: { ...headers, Accept: 'application/json' } });
    return response.json();
  };
  const { cases } = listSchema.parse(await ask('/api/cases'));
  for (const { id } of cases) {
    const { images } = caseSchema.parse(await ask(`/api/cases/${id}`));
    for (const { imageId } of images) {
      const { rows, columns } = imageSchema.parse(await ask(`/api/images/${imageId}`));
      if (rows === side && columns === side) return imageId;
    }
  }
  throw new Error(`the demo department has no image of ${side} × ${side}`);
}
