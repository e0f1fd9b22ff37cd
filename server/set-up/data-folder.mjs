/**
 * The folder of cluster, objects, caches and log. What lies in it is closed to others; the folder itself can be passed through when we
 * are root, because PostgreSQL then runs as another user.
 */
import { chmodSync, mkdirSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const mode = process.getuid?.() === 0 ? 0o711 : 0o700;

/** @param {string} folder */
export const makeDataFolder = (folder) => mkdirSync(folder, { recursive: true, mode });

/**
 * A new data folder for a test or a measurement, to be removed by who asked for it.
 * @param {string} purpose
 */
export function temporaryDataFolder(purpose) {
  const folder = mkdtempSync(join(tmpdir(), `pickglass-${purpose}-`));
  chmodSync(folder, mode);
  return folder;
}
