/** Keys of this installation: from the environment, or drawn once and kept beside the data for its owner only. */
import { randomBytes } from 'node:crypto';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Env } from '../env';
import { errorCode } from '../error-code';

/** Signs session tokens. */
export async function sessionKey({ sessionSecret, dataFolder }: Pick<Env, 'sessionSecret' | 'dataFolder'>): Promise<Uint8Array> {
  return new TextEncoder().encode(sessionSecret ?? (await keptSecret(dataFolder, 'session-secret')));
}

/** Hashes unique identifiers of images. */
export async function identityKey({ identitySecret, dataFolder }: Pick<Env, 'identitySecret' | 'dataFolder'>): Promise<Uint8Array> {
  return new TextEncoder().encode(identitySecret ?? (await keptSecret(dataFolder, 'identity-secret')));
}

async function keptSecret(folder: string, name: string): Promise<string> {
  const file = join(folder, name);
  await mkdir(folder, { recursive: true });
  try {
    // Fails where there is one: two servers that start together then read the same.
    await writeFile(file, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  } catch (error) {
    if (errorCode(error) !== 'EEXIST') throw error;
  }
  return readFile(file, 'utf8');
}
