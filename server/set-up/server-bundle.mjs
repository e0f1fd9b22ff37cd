/**
 * The server and its worker threads, bundled by esbuild into dist-server/. Packages stay outside the bundle: some find files of their
 * own by their place in node_modules.
 */
import { readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildWhenChanged } from './built-from.mjs';

const folder = 'dist-server';
const sources = ['server', 'workers', 'recon', 'db', 'package-lock.json'];

/**
 * @param {string} root
 * @returns {Promise<{ note: string, result: string }>} `result` is the file to run
 */
export async function buildServer(root) {
  const built = await buildWhenChanged({ root, folder, sources }, () => bundle(root));
  return { note: built ? 'built' : 'unchanged', result: join(root, folder, 'index.mjs') };
}

/** @param {string} root */
async function bundle(root) {
  // Imported here, because this file is read before packages are installed.
  const { build } = await import('esbuild');
  const workers = readdirSync(join(root, 'workers')).filter((name) => name.endsWith('.worker.ts'));
  rmSync(join(root, folder), { recursive: true, force: true });
  await build({
    absWorkingDir: root,
    entryPoints: ['server/index.ts', ...workers.map((name) => `workers/${name}`)],
    outdir: folder,
    entryNames: '[name]',
    outExtension: { '.js': '.mjs' },
    bundle: true,
    packages: 'external',
    platform: 'node',
    target: 'node20',
    format: 'esm',
    sourcemap: true,
    logLevel: 'silent',
  });
}
