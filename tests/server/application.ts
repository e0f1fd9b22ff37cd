/**
 * The real application for a test file: a database of its own with the production migrations, objects in a folder of its own, worker
 * threads, and two departments with one member per role. The log is kept, for the tests that look for what must not be in it.
 */
import { randomUUID } from 'node:crypto';
import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { hash } from 'bcryptjs';
import type { Express } from 'express';
import postgres from 'postgres';
import request from 'supertest';
import { openDatabase } from '../../db/client';
import { migrateDatabase } from '../../db/migrate';
import { seedDepartment } from '../../db/seed';
import { createApp } from '../../server/app';
import { roles, type Role } from '../../server/contract/route';
import type { Dependencies } from '../../server/dependencies';
import { readEnv } from '../../server/env';
import { openLog } from '../../server/log';
import { openDiskObjects } from '../../server/storage/disk-objects';
import { cachedImageValues } from '../../server/storage/image-values';
import { openWorkers, workersIn } from '../../workers/pool';

// A thread that compiles its sources takes seconds to start where other work shares the cores.
jest.setTimeout(60_000);

export const project = join(__dirname, '..', '..');
export const password = 'thread-counter-by-the-window';
/** The least work factor there is: tests sign in often, and the factor is not what they look at. */
const testRounds = 4;

export type Department = 'own' | 'other';
export const emailOf = (role: Role, department: Department = 'own'): string => `${role}@${department}.example`;

export interface Seeded {
  readonly departmentId: string;
  readonly members: Readonly<Record<Role, string>>;
  readonly scannerId: string;
  readonly coilId: string;
}

export interface Application {
  readonly app: Express;
  readonly deps: Dependencies;
  readonly databaseUrl: string;
  readonly own: Seeded;
  readonly other: Seeded;
  /** An agent that is signed in and keeps its cookie. */
  as(role: Role, department?: Department): Promise<ReturnType<typeof request.agent>>;
  /** Everything that was logged. */
  logged(): string;
  /** Names of the objects that are kept. */
  objectNames(): Promise<string[]>;
  objectBytes(): Promise<Buffer[]>;
  close(): Promise<void>;
}

/** Stands for the departments where a test wants an empty database. */
const nobody: Seeded = {
  departmentId: '',
  members: { technologist: '', 'lead-technologist': '', physicist: '', administrator: '' },
  scannerId: '',
  coilId: '',
};

/** `variables` override the environment, `through` sends the database's connections elsewhere, unless `seeded` nobody is in it. */
export async function openApplication({
  variables = {},
  through = (url) => url,
  seeded = true,
}: { variables?: Record<string, string>; through?: (url: string) => string; seeded?: boolean } = {}): Promise<Application> {
  const database = await createDatabase();
  await migrateDatabase(database.url, join(project, 'drizzle'));
  const dataFolder = await mkdtemp(join(tmpdir(), 'pickglass-test-'));
  const env = readEnv({
    NODE_ENV: 'test',
    DATABASE_URL: through(database.url),
    PICKGLASS_DATA: dataFolder,
    WORKER_THREADS: '1',
    ...variables,
  });
  const lines: string[] = [];
  const log = openLog('debug', { write: (line: string) => void lines.push(line) });
  const client = openDatabase(env.databaseUrl, { connections: 4 });
  const workers = openWorkers(workersIn(join(project, 'workers'), '.ts'), env.workerThreads);
  const objectFolder = join(dataFolder, 'objects');
  const objects = await openDiskObjects(objectFolder);
  const deps: Dependencies = {
    ...{ env, log, workers, objects, version: '0.0.0-test', db: client.db, sql: client.sql },
    values: cachedImageValues(objects),
    sessionKey: new TextEncoder().encode(randomUUID()),
    identityKey: new TextEncoder().encode(randomUUID()),
  };
  const app = createApp(deps);
  const objectPaths = async () => (await readdir(objectFolder, { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile());
  return {
    ...{ app, deps, databaseUrl: database.url },
    own: seeded ? await seed(deps, 'own') : nobody,
    other: seeded ? await seed(deps, 'other') : nobody,
    async as(role, department = 'own') {
      const agent = request.agent(app);
      await agent
        .post('/api/session')
        .send({ email: emailOf(role, department), password })
        .expect(200);
      return agent;
    },
    logged: () => lines.join(''),
    objectNames: async () => (await objectPaths()).map(({ name }) => name),
    objectBytes: async () => Promise.all((await objectPaths()).map(({ parentPath, name }) => readFile(join(parentPath, name)))),
    async close() {
      await workers.close();
      await client.close();
      await database.drop();
      await rm(dataFolder, { recursive: true, force: true });
    },
  };
}

async function createDatabase() {
  const cluster = process.env.TEST_DATABASE_URL;
  if (cluster === undefined) throw new Error('TEST_DATABASE_URL must name a PostgreSQL cluster for tests; `npm test` sets it');
  const name = `test_${randomUUID().replaceAll('-', '')}`;
  const superuser = postgres(cluster, { max: 1, onnotice: () => undefined });
  await superuser.unsafe(`create database ${name}`);
  const url = new URL(cluster);
  url.pathname = `/${name}`;
  return {
    url: url.href,
    async drop() {
      await superuser.unsafe(`drop database ${name} with (force)`);
      await superuser.end();
    },
  };
}

async function seed({ db }: Dependencies, department: Department): Promise<Seeded> {
  const passwordHash = await hash(password, testRounds);
  const seeded = await seedDepartment(db, {
    name: `${department} department`,
    members: roles.map((role) => ({ role, name: `The ${role} of ${department}`, email: emailOf(role, department), passwordHash })),
    scanners: [
      {
        ...{ name: 'Tern 3 T', manufacturer: 'Saltmarsh Imaging', model: 'Tern', fieldStrengthTesla: 3, serial: 'T1' },
        ...{ softwareVersion: '6.2', room: 'Room 2', coils: [{ name: 'Head 20', serial: 'H1', elements: 20 }] },
      },
    ],
  });
  const members = Object.fromEntries(roles.map((role, i) => [role, seeded.memberIds[i]])) as Record<Role, string>;
  const [scanner] = seeded.scanners;
  const coilId = scanner?.coilIds[0];
  if (scanner === undefined || coilId === undefined) throw new Error('the scanner of the tests was not seeded');
  return { departmentId: seeded.departmentId, members, scannerId: scanner.id, coilId };
}
