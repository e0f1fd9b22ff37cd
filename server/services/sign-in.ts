/**
 * Signing in. A wrong password and an unknown e-mail give the same answer in about the same time, and ten failures for one e-mail
 * from one address close the door for a quarter of an hour.
 */
import { createHash } from 'node:crypto';
import { compare, hash } from 'bcryptjs';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { Response } from 'express';
import type { Sql } from 'postgres';
import { findMemberByEmail } from '../../db/queries/members';
import type { Session } from '../contract/session';
import type { Dependencies } from '../dependencies';
import { AppError } from '../errors';
import { describeSession, openSession } from './sessions';

/** OWASP Password Storage Cheat Sheet: bcrypt with a work factor of at least 10. */
export const passwordRounds = 10;
const failuresAllowed = 10;
const failuresAllowedForAddress = 100;
const closedSeconds = 15 * 60;

/** Compared with when there is no such member, so that the answer takes as long. It is the hash of no known password. */
const hashOfNobody = hash(createHash('sha256').update(String(process.hrtime.bigint())).digest('hex'), passwordRounds);

export interface SignInGuard {
  readonly pair: RateLimiterPostgres;
  readonly address: RateLimiterPostgres;
}

/** Counters of failed attempts, in the database so that every server process sees the same. */
export function signInGuard(sql: Sql): SignInGuard {
  const storeClient = {
    query: async ({ text, values }: { text: string; values: (string | number | null)[] }) => {
      const rows = await sql.unsafe(text, values);
      return { rows, rowCount: rows.count };
    },
  };
  const counter = (keyPrefix: string, points: number) =>
    new RateLimiterPostgres({
      storeClient,
      storeType: 'client',
      tableName: 'sign_in_attempts',
      tableCreated: true,
      keyPrefix,
      points,
      duration: closedSeconds,
    });
  return { pair: counter('pair', failuresAllowed), address: counter('address', failuresAllowedForAddress) };
}

interface Attempt {
  readonly email: string;
  readonly password: string;
  readonly address: string;
}

/** Signs a member in, or refuses: `wrong-credentials`, or `too-many-attempts` with the seconds to wait. */
export async function signIn(deps: Dependencies, guard: SignInGuard, attempt: Attempt, response: Response): Promise<Session> {
  const pairKey = createHash('sha256').update(`${attempt.email.toLowerCase()}\n${attempt.address}`).digest('hex');
  const addressKey = createHash('sha256').update(attempt.address).digest('hex');
  // Every attempt is counted before the password is looked at: parallel guesses cannot slip through between look and count.
  await countAttempt(guard.pair, pairKey);
  await countAttempt(guard.address, addressKey);

  const found = await findMemberByEmail(deps.db, attempt.email);
  const matches = await compare(attempt.password, found?.passwordHash ?? (await hashOfNobody));
  if (found === undefined || !matches) throw new AppError('wrong-credentials');

  await guard.pair.delete(pairKey);
  await guard.address.reward(addressKey, 1);
  await openSession(deps, found.id, response);
  return describeSession({ ...found, memberId: found.id });
}

async function countAttempt(counter: RateLimiterPostgres, key: string): Promise<void> {
  try {
    await counter.consume(key);
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
    throw new AppError('too-many-attempts', {
      detail: `Wait ${Math.ceil(seconds / 60)} minutes before the next attempt`,
      retryAfterSeconds: seconds,
    });
  }
}
