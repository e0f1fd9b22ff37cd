/** What a scanner's page says of push: settings, tokens, and when it last sent. Lead technologists and administrators change it. */
import type { z } from 'zod';
import type { Database } from '../../db/client';
import { addToken, findPush, listTokens, revokeTokenOf, setPush } from '../../db/queries/push';
import { findScannerOf } from '../../db/queries/scanners';
import { changePush as changePushRoute, pushRefusals, type PushRefusal, type ScannerPush } from '../contract/push';
import type { Dependencies } from '../dependencies';
import { errorCode } from '../error-code';
import { AppError, invalidAt } from '../errors';
import { drawnToken, hashOfToken } from '../push/tokens';
import type { Caller } from './sessions';

type PushDependencies = Pick<Dependencies, 'db' | 'env'>;

/** Throws `not-found` unless the scanner is one of the department. */
export async function requireScanner(db: Database, caller: Caller, scannerId: string): Promise<void> {
  if ((await findScannerOf(db, caller.departmentId, scannerId)) === undefined) throw new AppError('not-found');
}

export async function readPush({ db, env }: PushDependencies, caller: Caller, scannerId: string): Promise<ScannerPush> {
  await requireScanner(db, caller, scannerId);
  const row = await findPush(db, scannerId);
  const tokens = await listTokens(db, scannerId);
  const { access } = changePushRoute;
  return {
    node: describeNode(env.dicomNode),
    aeTitle: row?.aeTitle ?? null,
    addresses: row?.addresses ?? [],
    received: { count: row?.receivedCount ?? 0, lastAt: moment(row?.lastReceivedAt) },
    refused: { count: row?.refusedCount ?? 0, lastAt: moment(row?.lastRefusedAt), last: asRefusal(row?.lastRefusal) },
    tokens: tokens.map(({ drawnAt, lastUsedAt, ...token }) => ({
      ...token,
      drawnAt: drawnAt.toISOString(),
      lastUsedAt: moment(lastUsedAt),
    })),
    mayChange: typeof access !== 'string' && access.includes(caller.role),
  };
}

const moment = (date: Date | null | undefined): string | null => date?.toISOString() ?? null;

const asRefusal = (stored: string | null | undefined): PushRefusal | null => pushRefusals.find((code) => code === stored) ?? null;

function describeNode(node: Dependencies['env']['dicomNode']): ScannerPush['node'] {
  if (node === undefined) return null;
  return { aeTitle: node.aeTitle, port: node.port, loopback: /^(127\.|localhost$|::1$)/.test(node.host) };
}

/** An AE title belongs to one scanner: it decides into whose inbox something goes. */
export async function changePush(
  deps: PushDependencies,
  caller: Caller,
  scannerId: string,
  { aeTitle, addresses }: z.output<typeof changePushRoute.body>,
): Promise<ScannerPush> {
  await requireScanner(deps.db, caller, scannerId);
  try {
    await setPush(deps.db, scannerId, { aeTitle, addresses: [...new Set(addresses)] });
  } catch (error) {
    if (isTaken(error)) throw invalidAt(['aeTitle'], 'another scanner has this AE title');
    throw error;
  }
  return readPush(deps, caller, scannerId);
}

/** PostgreSQL's code for a value that must be unique and is not. */
const isTaken = (error: unknown): boolean =>
  errorCode(error) === '23505' || (error instanceof Error && error.cause !== undefined && isTaken(error.cause));

export async function drawToken(deps: PushDependencies, caller: Caller, scannerId: string): Promise<{ token: string; push: ScannerPush }> {
  await requireScanner(deps.db, caller, scannerId);
  const token = drawnToken();
  await addToken(deps.db, { scannerId, tokenHash: hashOfToken(token), drawnById: caller.memberId });
  return { token, push: await readPush(deps, caller, scannerId) };
}

export async function revokeToken(
  deps: PushDependencies,
  caller: Caller,
  { scannerId, tokenId }: { scannerId: string; tokenId: string },
): Promise<ScannerPush> {
  await requireScanner(deps.db, caller, scannerId);
  if (!(await revokeTokenOf(deps.db, scannerId, tokenId))) throw new AppError('not-found');
  return readPush(deps, caller, scannerId);
}
