/**
 * The web client: exported by Expo into dist/ when its sources changed. The export goes to a folder beside and takes the place of
 * the old one only when it is whole. Metro keeps its cache in the system's temporary folder: the first export takes minutes, the next seconds.
 */
import { createReadStream, createWriteStream, readdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { constants, createBrotliCompress, createGzip } from 'node:zlib';
import { buildWhenChanged } from './built-from.mjs';
import { runCommand } from './run-command.mjs';

const folder = 'dist';
const fresh = '.expo/export';
const canvasKit = 'public/canvaskit.wasm';
const configuration = ['app.json', 'babel.config.js', 'metro.config.js', 'package-lock.json', 'tsconfig.json'];
const sources = ['app', 'components', 'assets', 'public', 'server/contract', ...configuration];

/** What every run of the Expo command line is told: no network, no telemetry. */
export const expoEnvironment = { EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1' };

/** @param {string} root */
export const expoProgram = (root) => join(root, 'node_modules', 'expo', 'bin', 'cli');

/**
 * @param {string} root
 * @param {AbortSignal} signal
 * @returns {Promise<{ note: string, result: undefined }>}
 */
export async function buildClient(root, signal) {
  const built = await buildWhenChanged({ root, folder, sources, leaveOut: [canvasKit] }, async () => {
    await copyCanvasKit(root, signal);
    rmSync(join(root, fresh), { recursive: true, force: true });
    await runCommand(process.execPath, [expoProgram(root), 'export', '--platform', 'web', '--output-dir', fresh], {
      cwd: root,
      // A NODE_ENV of the caller's would export a development build.
      env: { ...expoEnvironment, CI: '1', NODE_ENV: 'production' },
      signal,
    });
    await compressFiles(join(root, fresh));
    rmSync(join(root, folder), { recursive: true, force: true });
    renameSync(join(root, fresh), join(root, folder));
  });
  return { note: built ? 'exported' : 'unchanged', result: undefined };
}

/**
 * Puts Skia's WebAssembly among the public files, with the script that its package has for this.
 * @param {string} root
 * @param {AbortSignal} signal
 */
export async function copyCanvasKit(root, signal) {
  const script = join(root, 'node_modules', '@shopify', 'react-native-skia', 'scripts', 'setup-canvaskit.js');
  await runCommand(process.execPath, [script, 'public'], { cwd: root, signal });
}

/**
 * Compresses once what would otherwise be compressed for each visitor: a file beside each large one, with `.br` or `.gz` added.
 * @param {string} exported
 */
async function compressFiles(exported) {
  const names = readdirSync(exported, { recursive: true, encoding: 'utf8' });
  for (const name of names.filter((name) => /\.(js|wasm|css|ttf)$/.test(name))) {
    const file = join(exported, name);
    // Quality 9 of 11: WebAssembly of 8 MB takes a second, and 20 more for the last 5 per cent.
    const brotli = createBrotliCompress({ params: { [constants.BROTLI_PARAM_QUALITY]: 9 } });
    await pipeline(createReadStream(file), brotli, createWriteStream(`${file}.br`));
    await pipeline(createReadStream(file), createGzip({ level: 9 }), createWriteStream(`${file}.gz`));
  }
}
