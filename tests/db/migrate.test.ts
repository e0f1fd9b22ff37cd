/** The migrations bring any database to the present schema, once. */
import { join } from 'node:path';
import { migrateDatabase } from '../../db/migrate';
import { openApplication, project, type Application } from '../server/application';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

it('two servers that start together migrate one after the other, and a migrated database stays as it is', async () => {
  const folder = join(project, 'drizzle');
  const { sql } = application.deps;
  const applied = () => sql`select hash from drizzle.__drizzle_migrations order by id`;
  const before = [...(await applied())];
  expect(before.length).toBeGreaterThan(1);
  await Promise.all([migrateDatabase(application.databaseUrl, folder), migrateDatabase(application.databaseUrl, folder)]);
  expect([...(await applied())]).toEqual(before);
  expect([...(await sql`select name from departments order by name`)].map(({ name }) => name)).toEqual([
    'other department',
    'own department',
  ]);
});

it('two servers that start together on an empty database make one schema', async () => {
  const { sql } = application.deps;
  await sql.unsafe('create database twice_migrated');
  const url = new URL(application.databaseUrl);
  url.pathname = '/twice_migrated';
  try {
    const folder = join(project, 'drizzle');
    await expect(Promise.all([migrateDatabase(url.href, folder), migrateDatabase(url.href, folder)])).resolves.toHaveLength(2);
  } finally {
    await sql.unsafe('drop database twice_migrated with (force)');
  }
});
