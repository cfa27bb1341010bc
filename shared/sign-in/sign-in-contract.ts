import * as z from 'zod';
import { abilities } from '../access/ability';
import { roles, scopeKinds } from '../access/role';
import { endpoint } from '../contract/endpoint';

export const sessionReply = z.strictObject({
  person: z.strictObject({
    id: z.uuid(),
    name: z.string(),
    email: z.string().nullable(),
    locale: z.enum(['en', 'es']),
    timeZone: z.string(),
  }),
  organisation: z.strictObject({ id: z.uuid(), name: z.string(), timeZone: z.string() }),
  roles: z.array(
    z.strictObject({
      role: z.enum(roles),
      scopeKind: z.enum(scopeKinds),
      scopeId: z.uuid(),
      scopeName: z.string(),
    }),
  ),
  abilities: z.array(z.enum(abilities)),
});

export const readSession = endpoint({
  method: 'GET',
  path: '/session',
  summary: 'Who is signed in, with roles and abilities',
  access: 'signed-in',
  reply: sessionReply,
});

export const signIn = endpoint({
  method: 'POST',
  path: '/session',
  summary: 'Sign in with e-mail and password',
  access: 'public',
  body: z.strictObject({
    email: z.string().min(1).max(254),
    password: z.string().min(1).max(1000),
  }),
  reply: sessionReply,
});

export const signOut = endpoint({
  method: 'DELETE',
  path: '/session',
  summary: 'Sign out of this browser',
  access: 'public',
  reply: z.undefined(),
});

export const signInEndpoints = [readSession, signIn, signOut];
