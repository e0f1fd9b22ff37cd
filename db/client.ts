/** The connection to PostgreSQL: one pool, Drizzle over it, and the raw client for the few who need it. */
import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres, { type Sql } from 'postgres';

/** Drizzle without a relational schema: queries are written out in `queries/`. A transaction has the same face. */
export type Database = Pick<PostgresJsDatabase, 'select' | 'selectDistinctOn' | 'insert' | 'update' | 'delete' | 'execute' | 'transaction'>;

export interface DatabaseClient {
  readonly db: Database;
  readonly sql: Sql;
  close(): Promise<void>;
}

/** Opens the pool. Nothing connects before the first query. Notices and values are not logged. */
export function openDatabase(url: string, { connections = 10 }: { connections?: number } = {}): DatabaseClient {
  const sql = postgres(url, {
    max: connections,
    connect_timeout: 5,
    idle_timeout: 60,
    // Seconds between attempts to connect: while the database is away, a request is told so at once and not after a growing wait.
    backoff: () => 0.1,
    onnotice: () => undefined,
  });
  return { db: drizzle(sql), sql, close: () => sql.end({ timeout: 5 }) };
}
