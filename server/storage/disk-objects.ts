/**
 * Objects as files of one folder, readable by their owner only. A file is written beside its place, flushed and renamed, so that
 * an object is there whole or not at all, also after a power cut.
 */
import { createHash, randomUUID } from 'node:crypto';
import { chmod, mkdir, open, readFile, rename, rm, stat, utimes } from 'node:fs/promises';
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
      if (!(await renew(place, bytes.byteLength))) await writeWhole(place, bytes);
      return digest;
    },
    async get(digest) {
      const bytes = await readFile(placeOf(digest));
      if (sha256(bytes) !== digest) throw new Error(`object ${digest} is damaged`);
      return bytes;
    },
    remove: (digest, unusedForMs) => removeUnused(placeOf(digest), unusedForMs),
  };
}

/** Marks an object as kept just now, for whoever might be about to remove it. False where it is not there whole. */
async function renew(place: string, size: number): Promise<boolean> {
  const now = new Date();
  try {
    await utimes(place, now, now);
    return (await stat(place)).size === size;
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return false;
    throw error;
  }
}

/**
 * Out of its place first, and only then looked at: whoever keeps the same bytes in between either has renewed the object before it was
 * moved, and it goes back, or finds none and writes it anew.
 */
async function removeUnused(place: string, unusedForMs: number): Promise<boolean> {
  const aside = join(dirname(place), `.leaving-${randomUUID()}`);
  try {
    await rename(place, aside);
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return true;
    throw error;
  }
  const isUnused = Date.now() - (await stat(aside)).mtimeMs >= unusedForMs;
  if (isUnused) await rm(aside);
  else await rename(aside, place);
  return isUnused;
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
