/** The key that signs session tokens: from the environment, or drawn once and kept beside the data for its owner only. */
import { randomBytes } from 'node:crypto';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Env } from '../env';
import { errorCode } from '../error-code';

export async function sessionKey({ sessionSecret, dataFolder }: Pick<Env, 'sessionSecret' | 'dataFolder'>): Promise<Uint8Array> {
  return new TextEncoder().encode(sessionSecret ?? (await keptSecret(dataFolder)));
}

async function keptSecret(folder: string): Promise<string> {
  const file = join(folder, 'session-secret');
  await mkdir(folder, { recursive: true });
  try {
    // Fails where there is one: two servers that start together then read the same.
    await writeFile(file, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  } catch (error) {
    if (errorCode(error) !== 'EEXIST') throw error;
  }
  return readFile(file, 'utf8');
}
