/**
 * Passwords of the demo accounts. They are drawn at the first start and kept in a file that only its owner can read, so that no
 * known password is ever shipped and the start script can show them each time.
 */
import { randomInt } from 'node:crypto';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import { roleSchema } from '../contract/route';
import { people } from './department';

const accountsSchema = z.array(z.object({ role: roleSchema, name: z.string(), email: z.string(), password: z.string() }));
export type DemoAccount = z.infer<typeof accountsSchema>[number];

export const accountsFile = (dataFolder: string): string => join(dataFolder, 'demo-accounts.json');

/** Without letters and digits that are taken for one another; 16 of 31 make 79 bits. */
const alphabet = 'abcdefghjkmnpqrstuvwxyz23456789';
const groups = 4;
const groupLength = 4;

const randomPassword = (): string =>
  Array.from({ length: groups }, () => Array.from({ length: groupLength }, () => alphabet[randomInt(alphabet.length)]).join('')).join('-');

/** Draws a password for each of the people and keeps the accounts. */
export async function drawAccounts(dataFolder: string): Promise<DemoAccount[]> {
  const accounts = people.map((person) => ({ ...person, password: randomPassword() }));
  const ordered = accounts.map(({ role, name, email, password }) => ({ role, name, email, password }));
  await writeFile(accountsFile(dataFolder), JSON.stringify(ordered, null, 2), { mode: 0o600 });
  return ordered;
}

/** The accounts that were drawn. */
export async function readAccounts(dataFolder: string): Promise<DemoAccount[]> {
  return accountsSchema.parse(JSON.parse(await readFile(accountsFile(dataFolder), 'utf8')));
}
