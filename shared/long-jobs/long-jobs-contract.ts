import * as z from 'zod';
import { endpoint } from '../contract/endpoint';

export const longJobStates = ['waiting', 'running', 'finished', 'failed', 'cancelled'] as const;

/** Work that takes longer than a request: asked for, then followed. */
export const longJob = z.strictObject({
  id: z.uuid(),
  kind: z.string(),
  state: z.enum(longJobStates),
  /** Steps done; of how many, once that is known. */
  done: z.int(),
  total: z.int().nullable(),
  /** Why it failed, in words. */
  error: z.string().nullable(),
  createdAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
});

export const readLongJob = endpoint({
  method: 'GET',
  path: '/long-jobs/:id',
  summary: 'How far a piece of long work of one’s own has come',
  access: 'signed-in',
  params: z.strictObject({ id: z.uuid() }),
  reply: longJob,
});

export const cancelLongJob = endpoint({
  method: 'POST',
  path: '/long-jobs/:id/cancel',
  summary: 'Give up a piece of long work of one’s own; what it has written so far stays',
  access: 'signed-in',
  params: z.strictObject({ id: z.uuid() }),
  reply: longJob,
});

export const longJobsEndpoints = [readLongJob, cancelLongJob];
