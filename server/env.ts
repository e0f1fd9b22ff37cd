/**
 * The environment, read and checked in one place. Defaults are embedded; a variable overrides its default; a wrong value stops the
 * start with the name of the variable, the rule and the value.
 */
import { resolve } from 'node:path';
import { z } from 'zod';
import { aeTitleSchema } from './contract/push';

const mebibyte = 1024 * 1024;
const wholeNumber = (least: number, most: number) => z.coerce.number().int().min(least).max(most);
const origin = z
  .url({ protocol: /^https?$/ })
  .refine((value) => new URL(value).origin === value, 'must be an origin without a path, as https://host:port');

const variables = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('production'),
  /** 0 takes a free port. */
  PORT: wholeNumber(0, 65_535).default(0),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  /** Folder of objects, secret and demo accounts. */
  PICKGLASS_DATA: z.string().min(1).default('.pickglass'),
  /** Signs session cookies. Left out, one is drawn at the first start and kept in the data folder. */
  SESSION_SECRET: z.string().min(32).optional(),
  /** Hashes the unique identifiers of images. Left out, one is drawn at the first start and kept in the data folder. */
  IDENTITY_SECRET: z.string().min(32).optional(),
  /** Where browsers see the server, when that is not the address it listens on (a proxy, the development server). */
  PUBLIC_ORIGIN: origin.optional(),
  UPLOAD_FILE_MIB: wholeNumber(1, 1024).default(64),
  UPLOAD_FILES: wholeNumber(1, 1000).default(64),
  UPLOAD_TOTAL_MIB: wholeNumber(1, 16_384).default(512),
  WORKER_THREADS: wholeNumber(1, 64).default(2),
  /** The most seconds that reading one file may take; a small file gets less (workers/reading-thread.ts). */
  READ_SECONDS: wholeNumber(1, 600).default(15),
  /** Where scanners send to. Left out, nothing listens. 0 takes a free port; 104 is DICOM's own, 11112 the one without privileges. */
  DICOM_NODE_PORT: wholeNumber(0, 65_535).optional(),
  DICOM_NODE_HOST: z.string().min(1).default('127.0.0.1'),
  DICOM_NODE_AE_TITLE: aeTitleSchema.default('PICKGLASS'),
  /** Days that images wait in a scanner's inbox. */
  INBOX_DAYS: wholeNumber(1, 3650).default(14),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
});

/** Values of these are never repeated in a message. */
const secrets = new Set(['DATABASE_URL', 'SESSION_SECRET', 'IDENTITY_SECRET']);

export interface Env {
  readonly mode: 'development' | 'test' | 'production';
  readonly port: number;
  readonly host: string;
  readonly databaseUrl: string;
  readonly dataFolder: string;
  readonly sessionSecret: string | undefined;
  readonly identitySecret: string | undefined;
  readonly publicOrigin: string | undefined;
  readonly upload: { readonly fileBytes: number; readonly files: number; readonly totalBytes: number };
  readonly workerThreads: number;
  readonly readMilliseconds: number;
  /** Undefined where it is off. */
  readonly dicomNode: { readonly port: number; readonly host: string; readonly aeTitle: string } | undefined;
  readonly inboxDays: number;
  readonly logLevel: string;
}

/** Reads the variables of `source`. Throws an Error that names every wrong variable, its rule and its value. */
export function readEnv(source: Readonly<Record<string, string | undefined>>): Env {
  const given = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== undefined && value !== ''));
  const parsed = variables.safeParse(given);
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => `${describe(String(issue.path[0]), given)}: ${issue.message}`);
    throw new Error(`The environment is not usable.\n${faults.join('\n')}`);
  }
  const values = parsed.data;
  return {
    mode: values.NODE_ENV,
    port: values.PORT,
    host: values.HOST,
    databaseUrl: values.DATABASE_URL,
    dataFolder: resolve(values.PICKGLASS_DATA),
    sessionSecret: values.SESSION_SECRET,
    identitySecret: values.IDENTITY_SECRET,
    publicOrigin: values.PUBLIC_ORIGIN,
    upload: {
      fileBytes: values.UPLOAD_FILE_MIB * mebibyte,
      files: values.UPLOAD_FILES,
      totalBytes: values.UPLOAD_TOTAL_MIB * mebibyte,
    },
    workerThreads: values.WORKER_THREADS,
    readMilliseconds: values.READ_SECONDS * 1000,
    dicomNode:
      values.DICOM_NODE_PORT === undefined
        ? undefined
        : { port: values.DICOM_NODE_PORT, host: values.DICOM_NODE_HOST, aeTitle: values.DICOM_NODE_AE_TITLE },
    inboxDays: values.INBOX_DAYS,
    logLevel: values.LOG_LEVEL,
  };
}

function describe(name: string, given: Readonly<Record<string, string | undefined>>): string {
  const value = given[name];
  if (value === undefined) return `${name} is not set`;
  return secrets.has(name) ? name : `${name}=${value}`;
}
