import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { sessionReply } from './sign-in-contract';

/** Long enough for a pass phrase; what is wrong with it is the server's to say in words. */
const newPassword = z.string().min(1).max(1000);
/** 32 random bytes in base64url. */
const byToken = z.strictObject({ token: z.string().min(1).max(100) });
const nothing = z.undefined();

export const personName = z.string().trim().min(1).max(120);
export const localeField = z.enum(['en', 'es']);

function isTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}

/** An IANA time zone. */
export const timeZoneField = z
  .string()
  .max(60)
  .refine(isTimeZone, { error: 'This is not a time zone, such as America/Chicago.' });

export const requestPasswordReset = endpoint({
  method: 'POST',
  path: '/password-resets',
  summary: 'Ask for a letter with a link to a new password; answers alike for every address',
  access: 'public',
  body: z.strictObject({ email: z.string().trim().min(1).max(254) }),
  reply: nothing,
});

export const resetPassword = endpoint({
  method: 'PUT',
  path: '/password-resets/:token',
  summary: 'Choose a new password by the link of a letter; every session ends',
  access: 'public',
  params: byToken,
  body: z.strictObject({ password: newPassword }),
  reply: nothing,
});

export const readInvitation = endpoint({
  method: 'GET',
  path: '/invitations/:token',
  summary: 'Who is invited, by whom and to where',
  access: 'public',
  params: byToken,
  reply: z.strictObject({
    email: z.string(),
    name: z.string(),
    organisationName: z.string(),
    /** Empty when nobody did in person. */
    invitedBy: z.string(),
  }),
});

export const acceptInvitation = endpoint({
  method: 'PUT',
  path: '/invitations/:token',
  summary: 'Accept an invitation with a password',
  access: 'public',
  params: byToken,
  body: z.strictObject({ password: newPassword, name: personName.optional() }),
  reply: nothing,
});

export const ownSession = z.strictObject({
  /** Not the cookie's value: names the session and opens nothing. */
  id: z.string(),
  current: z.boolean(),
  /** Browser and system in words, as far as they are known. */
  device: z.string(),
  createdAt: z.iso.datetime(),
  lastSeenAt: z.iso.datetime(),
});

export const listOwnSessions = endpoint({
  method: 'GET',
  path: '/sessions',
  summary: 'Where the person is signed in, the latest used first',
  access: 'signed-in',
  reply: z.strictObject({ sessions: z.array(ownSession) }),
});

export const endOwnSessions = endpoint({
  method: 'DELETE',
  path: '/sessions',
  summary: 'Sign out everywhere: every session of the person, or all but this one',
  access: 'signed-in',
  query: z.strictObject({ keep: z.enum(['none', 'this']).default('none') }),
  reply: nothing,
});

export const endOwnSession = endpoint({
  method: 'DELETE',
  path: '/sessions/:id',
  summary: 'Sign out one session of the person',
  access: 'signed-in',
  params: z.strictObject({ id: z.string().regex(/^[0-9a-f]{32}$/) }),
  reply: nothing,
});

export const editOwnDetails = endpoint({
  method: 'PATCH',
  path: '/session/person',
  summary: 'Change what the person is called, their language and their time zone',
  access: 'signed-in',
  body: z.strictObject({
    name: personName.optional(),
    locale: localeField.optional(),
    timeZone: timeZoneField.optional(),
  }),
  reply: sessionReply,
});

export const changePassword = endpoint({
  method: 'PUT',
  path: '/session/password',
  summary: 'Choose a new password, giving the present one; other sessions end',
  access: 'signed-in',
  body: z.strictObject({ currentPassword: z.string().min(1).max(1000), newPassword }),
  reply: nothing,
});

export const accountEndpoints = [
  requestPasswordReset,
  resetPassword,
  readInvitation,
  acceptInvitation,
  listOwnSessions,
  endOwnSessions,
  endOwnSession,
  editOwnDetails,
  changePassword,
];
