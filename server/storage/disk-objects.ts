/**
 * Objects as files of one folder, readable by their owner only. A file is written beside its place, flushed and renamed, so that
 * an object is there whole or not at all, also after a power cut.
 */
import { createHash, randomUUID } from 'node:crypto';
import { chmod, mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { errorCode } from '../error-code';
import type { ObjectStore } from './object-store';

const digestPattern = /^[0-9a-f]{64}$/;

export const sha256 = (bytes: Uint8Array | string): string => createHash('sha256').update(bytes).digest('hex');

/** A store in `folder`, which is made with access for its owner only. */
export async function openDiskObjects(folder: string): Promise<ObjectStore> {
  await mkdir(folder, { recursive: true });
  await chmod(folder, 0o700);

  const placeOf = (digest: string): string => {
    if (!digestPattern.test(digest)) throw new RangeError(`digest must be 64 hexadecimal digits, got ${digest.length} characters`);
    return join(folder, digest.slice(0, 2), digest);
  };

  return {
    async put(bytes) {
      const digest = sha256(bytes);
      const place = placeOf(digest);
      if (!(await exists(place, bytes.byteLength))) await writeWhole(place, bytes);
      return digest;
    },
    async get(digest) {
      const bytes = await readFile(placeOf(digest));
      if (sha256(bytes) !== digest) throw new Error(`object ${digest} is damaged`);
      return bytes;
    },
  };
}

async function exists(place: string, size: number): Promise<boolean> {
  try {
    return (await stat(place)).size === size;
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return false;
    throw error;
  }
}

async function writeWhole(place: string, bytes: Uint8Array): Promise<void> {
  const folder = dirname(place);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const draft = join(folder, `.draft-${randomUUID()}`);
  try {
    await writeFlushed(draft, bytes);
    await rename(draft, place);
  } catch (error) {
    await rm(draft, { force: true });
    throw error;
  }
  await flushFolder(folder);
}

async function writeFlushed(path: string, bytes: Uint8Array): Promise<void> {
  const file = await open(path, 'wx', 0o600);
  try {
    await file.writeFile(bytes);
    await file.sync();
  } finally {
    await file.close();
  }
}

/** A rename is durable only once its folder is. */
async function flushFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
