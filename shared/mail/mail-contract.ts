import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { letterKinds, letterStates } from './letter-kind';

const params = z.strictObject({ id: z.uuid() });

export const letterRow = z.strictObject({
  id: z.uuid(),
  kind: z.enum(letterKinds),
  state: z.enum(letterStates),
  toAddress: z.string(),
  personName: z.string().nullable(),
  subject: z.string(),
  attempts: z.int(),
  nextAttemptAt: z.iso.datetime(),
  lastError: z.string().nullable(),
  createdAt: z.iso.datetime(),
  sentAt: z.iso.datetime().nullable(),
});

export const letterSorts = ['createdAt', '-createdAt', 'sentAt', '-sentAt'] as const;

/** The outbox, newest first, with how many letters stand in each state under the other filters. */
export const listLetters = endpoint({
  method: 'GET',
  path: '/mail/letters',
  summary: 'The outbox: letters waiting, sent and refused',
  access: 'mail.read',
  query: z.strictObject({
    q: z.string().max(100).optional(),
    state: z.enum(letterStates).optional(),
    kind: z.enum(letterKinds).optional(),
    sort: z.enum(letterSorts).default('-createdAt'),
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(letterRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
    counts: z.strictObject({ queued: z.int(), sent: z.int(), dead: z.int() }),
    /** When the oldest letter that waits was written: a long time means that sending is in trouble. */
    oldestQueuedAt: z.iso.datetime().nullable(),
  }),
});

export const readLetter = endpoint({
  method: 'GET',
  path: '/mail/letters/:id',
  summary: 'One letter with its text part',
  access: 'mail.read',
  params,
  reply: z.strictObject({
    ...letterRow.shape,
    plain: z.string(),
    /** Links that sign somebody in are blotted out, here and in the formatted view. */
    secretsHidden: z.boolean(),
  }),
});

/** As the reader's mail program gets it; a document that can run nothing and load nothing. */
export const showLetter = endpoint({
  method: 'GET',
  path: '/mail/letters/:id/html',
  summary: 'One letter as it looks, an HTML document for a sandboxed frame',
  access: 'mail.read',
  params,
  reply: z.undefined(),
});

/** Letters that are not dead (any more) are passed over: somebody else was quicker. */
export const retryLetters = endpoint({
  method: 'POST',
  path: '/mail/retries',
  summary: 'Try refused letters again',
  access: 'mail.retry',
  body: z.strictObject({ ids: z.array(z.uuid()).min(1).max(200) }),
  reply: z.strictObject({ queued: z.int() }),
});

export const mailEndpoints = [listLetters, readLetter, showLetter, retryLetters];
