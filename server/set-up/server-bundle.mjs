/**
 * The server and its worker threads, bundled by esbuild into dist-server/, packages included: as bundles they start sooner, and those
 * that are CommonJS give their names as they do in development.
 */
import { readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildWhenChanged } from './built-from.mjs';

const folder = 'dist-server';
/** Packages that find other files in their folder: scripts of threads, WebAssembly. */
const external = ['piscina', 'pino', 'pino-http', '@cornerstonejs/*', 'h5wasm'];
/** CommonJS packages in an ES module still ask for Node's own modules with `require`. */
const banner = "import { createRequire as requireFrom } from 'node:module';\nconst require = requireFrom(import.meta.url);";
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
    external,
    banner: { js: banner },
    platform: 'node',
    target: 'node20',
    format: 'esm',
    sourcemap: true,
    logLevel: 'silent',
  });
}
