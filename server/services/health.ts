/** Whether the product is up: the database answers, and the workers have threads. */
import { sql } from 'drizzle-orm';
import type { Dependencies } from '../dependencies';
import { AppError } from '../errors';

const patienceMs = 3000;

export async function readHealth({ db, workers, version }: Dependencies) {
  await Promise.race([db.execute(sql`select 1`), tooLate()]).catch(() => {
    throw new AppError('database-away');
  });
  return { status: 'ok' as const, version, database: 'ok' as const, workers: workers.threads() };
}

/** A database that neither answers nor refuses counts as away. */
const tooLate = (): Promise<never> =>
  new Promise((_resolve, reject) => {
    setTimeout(() => reject(new Error(`the database did not answer within ${patienceMs} ms`)), patienceMs).unref();
  });
