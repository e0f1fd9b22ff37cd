/** Brings a database to the present schema with the generated migrations, one process at a time. */
import { drizzle } from 'drizzle-orm/postgres-js';
import { migrate } from 'drizzle-orm/postgres-js/migrator';
import postgres from 'postgres';

/** Any number that nothing else in the database locks; two servers that start together take turns. */
const migrationLock = 5_230_871;

/** Applies the migrations of `folder` that the database at `url` lacks. */
export async function migrateDatabase(url: string, folder: string): Promise<void> {
  const sql = postgres(url, { max: 1, connect_timeout: 10, onnotice: () => undefined });
  try {
    await sql`select pg_advisory_lock(${migrationLock})`;
    await migrate(drizzle(sql), { migrationsFolder: folder });
  } finally {
    await sql.end({ timeout: 5 });
  }
}
