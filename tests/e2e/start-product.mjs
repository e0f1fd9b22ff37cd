/**
 * Before the tests in the browser: the product, started by its start script on a free port with a data folder of its own, unless
 * PICKGLASS_URL names one that runs; then PICKGLASS_DATA names its data folder.
 */
import { spawn } from 'node:child_process';
import { dirname, join } from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { temporaryDataFolder } from '../../server/set-up/data-folder.mjs';
import { keepProduct } from './kept-product.mjs';

const script = join(dirname(fileURLToPath(import.meta.url)), '..', '..', 'server', 'start.mjs');

export default async function startProduct() {
  if (process.env.PICKGLASS_URL !== undefined) return;
  const data = temporaryDataFolder('browser');
  // Empty is as good as unset: whatever the caller's shell says, the product gets a database of its own.
  const env = { ...process.env, PORT: '0', PICKGLASS_DATA: data, DATABASE_URL: '' };
  const child = spawn(process.execPath, [script], { env, stdio: ['ignore', 'pipe', 'inherit'] });
  keepProduct({ child, data });
  const ended = new Promise((_, reject) => {
    child.once('exit', (code) => reject(new Error(`server/start.mjs ended with code ${code} before the product was ready`)));
  });
  ended.catch(() => undefined);
  process.env.PICKGLASS_URL = await Promise.race([addressFrom(child.stdout), ended]);
  process.env.PICKGLASS_DATA = data;
}

/**
 * Reads the lines of the start script until the one that says where the product is.
 * @param {import('node:stream').Readable} output
 * @returns {Promise<string>}
 */
function addressFrom(output) {
  return new Promise((resolve) => {
    createInterface({ input: output }).on('line', (line) => {
      if (!line.startsWith('demo account:')) console.error(line);
      const ready = /^Pickglass ready: (http:\/\/127\.0\.0\.1:\d+)$/.exec(line);
      if (ready?.[1] !== undefined) resolve(ready[1]);
    });
  });
}
