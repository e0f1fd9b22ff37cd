/** Sign in, who am I, sign out. The session itself is an HttpOnly cookie. */
import { z } from 'zod';
import { everyMember, identifier, roleSchema, route } from './route';

export const memberSchema = z.object({ id: identifier, name: z.string(), email: z.string(), role: roleSchema });
export type Member = z.infer<typeof memberSchema>;

export const sessionSchema = z.object({ member: memberSchema, department: z.object({ id: identifier, name: z.string() }) });
export type Session = z.infer<typeof sessionSchema>;

export const signIn = route({
  method: 'post',
  path: '/api/session',
  summary: 'Sign in with e-mail and password',
  access: 'anyone',
  body: z.object({ email: z.string().trim().min(3).max(254), password: z.string().min(1).max(200) }),
  output: sessionSchema,
});

export const whoAmI = route({
  method: 'get',
  path: '/api/session',
  summary: 'The member of this session',
  access: everyMember,
  output: sessionSchema,
});

export const signOut = route({ method: 'delete', path: '/api/session', summary: 'Sign out', access: 'anyone', status: 204 });
