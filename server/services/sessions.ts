/**
 * Sessions: a signed token in a cookie that scripts cannot read, and a row in the database that signing out removes. The token
 * names the row and nothing else; who the member is and what the role allows is read anew with every request.
 */
import { parseCookie } from 'cookie';
import { errors, jwtVerify, SignJWT } from 'jose';
import { z } from 'zod';
import type { CookieOptions, Response } from 'express';
import { addSession, findMemberBySession, removeEndedSessions, removeSession } from '../../db/queries/members';
import type { Role } from '../contract/route';
import type { Session } from '../contract/session';
import type { Dependencies } from '../dependencies';

/** Who is calling: read from the session, never from the request's body. */
export interface Caller {
  readonly sessionId: string;
  readonly memberId: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly departmentId: string;
  readonly departmentName: string;
}

type Keys = Pick<Dependencies, 'sessionKey' | 'db' | 'env'>;

const cookieName = 'pickglass_session';
const sessionHours = 12;
const audience = 'pickglass';
const claimsSchema = z.object({ jti: z.uuid() });

const cookieOptions = ({ env }: Keys): CookieOptions => ({
  httpOnly: true,
  sameSite: 'strict',
  path: '/',
  secure: env.publicOrigin?.startsWith('https:') ?? false,
});

/** Opens a session for a member and puts its token into the answer's cookie. */
export async function openSession(keys: Keys, memberId: string, response: Response): Promise<void> {
  const expiresAt = new Date(Date.now() + sessionHours * 3_600_000);
  await removeEndedSessions(keys.db, memberId);
  const sessionId = await addSession(keys.db, { memberId, expiresAt });
  const token = await new SignJWT()
    .setProtectedHeader({ alg: 'HS256' })
    .setJti(sessionId)
    .setAudience(audience)
    .setExpirationTime(expiresAt)
    .sign(keys.sessionKey);
  response.cookie(cookieName, token, { ...cookieOptions(keys), expires: expiresAt });
}

/** The caller of a request by its Cookie header, or undefined: no cookie, a forged or ended token, a session signed out of. */
export async function readSession(keys: Keys, cookieHeader: string | undefined): Promise<Caller | undefined> {
  const sessionId = await readSessionId(keys, cookieHeader);
  const member = sessionId === undefined ? undefined : await findMemberBySession(keys.db, sessionId);
  if (sessionId === undefined || member === undefined) return undefined;
  const { id: memberId, ...rest } = member;
  return { sessionId, memberId, ...rest };
}

/** Ends the session of a request, if it has one, and clears the cookie. */
export async function closeSession(keys: Keys, cookieHeader: string | undefined, response: Response): Promise<void> {
  const sessionId = await readSessionId(keys, cookieHeader);
  if (sessionId !== undefined) await removeSession(keys.db, sessionId);
  response.clearCookie(cookieName, cookieOptions(keys));
}

/** A caller as the contract describes the session. */
export const describeSession = (caller: Omit<Caller, 'sessionId'>): Session => ({
  member: { id: caller.memberId, name: caller.name, email: caller.email, role: caller.role },
  department: { id: caller.departmentId, name: caller.departmentName },
});

async function readSessionId({ sessionKey }: Keys, cookieHeader: string | undefined): Promise<string | undefined> {
  const token = parseCookie(cookieHeader ?? '')[cookieName];
  if (token === undefined) return undefined;
  try {
    const { payload } = await jwtVerify(token, sessionKey, { algorithms: ['HS256'], audience });
    return claimsSchema.safeParse(payload).data?.jti;
  } catch (error) {
    // A token that is not ours, or no longer: the caller is simply not signed in.
    if (error instanceof errors.JOSEError) return undefined;
    throw error;
  }
}
