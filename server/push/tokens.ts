/** Tokens of scanners: drawn here, shown once, kept as a hash. The form is that of RFC 6750. */
import { createHash, randomBytes } from 'node:crypto';
import type { Database } from '../../db/client';
import { noteTokenUse } from '../../db/queries/push';

/** A scanner that sends, and whose department it belongs to. */
export interface SendingScanner {
  readonly scannerId: string;
  readonly departmentId: string;
}

/** Says what it is to whoever finds it in a settings file. */
const prefix = 'pickglass_';

export const drawnToken = (): string => prefix + randomBytes(32).toString('base64url');

/** 256 random bits cannot be guessed from their hash: no salt and no slow hash is needed. */
export const hashOfToken = (token: string): string => createHash('sha256').update(token).digest('hex');

/** The scanner that an Authorization header stands for. */
export async function scannerOfToken(db: Database, authorization: string | undefined): Promise<SendingScanner | undefined> {
  const token = /^Bearer +(pickglass_[\w-]{43}) *$/i.exec(authorization ?? '')?.[1];
  return token === undefined ? undefined : noteTokenUse(db, hashOfToken(token));
}
