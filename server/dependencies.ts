/** What the services work with. Made once by `index.ts` (or a test) and passed along; nothing is reached for globally. */
import type { Logger } from 'pino';
import type { Database, DatabaseClient } from '../db/client';
import type { WorkerPool } from '../workers/pool';
import type { Env } from './env';
import type { ImageValues } from './storage/image-values';
import type { ObjectStore } from './storage/object-store';

export interface Dependencies {
  readonly env: Env;
  readonly version: string;
  readonly log: Logger;
  readonly db: Database;
  readonly sql: DatabaseClient['sql'];
  readonly objects: ObjectStore;
  readonly values: ImageValues;
  readonly workers: WorkerPool;
  /** Key of the session tokens, 32 bytes or more. */
  readonly sessionKey: Uint8Array;
  /** Key of the hashes that stand for unique identifiers, 32 bytes or more. Another key, and slices of a series no longer find each other. */
  readonly identityKey: Uint8Array;
}
