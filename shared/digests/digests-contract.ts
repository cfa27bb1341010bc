import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { monthPattern } from '../compliance/month';
import { digestContent } from './digest-content';

const month = z.string().regex(monthPattern, 'Write a month as 2026-03.');
const rate = z.number().min(0).max(1).nullable();

/** A digest in a list: whose month it is, and the figures that make one open it. */
export const digestRow = z.strictObject({
  id: z.uuid(),
  chainId: z.uuid(),
  chainName: z.string(),
  month,
  rate,
  change: z.number().nullable(),
  overdue: z.int(),
  findings: z.int(),
  madeAt: z.iso.datetime(),
});

export const listDigests = endpoint({
  method: 'GET',
  path: '/digests',
  summary: 'Digests of the chains that the reader answers for, newest first',
  access: 'digests.read',
  query: z.strictObject({
    chain: z.uuid().optional(),
    month: month.optional(),
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(digestRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
    /** Chains that any digest in sight is about. */
    chains: z.array(z.strictObject({ id: z.uuid(), name: z.string() })),
  }),
});

export const readDigest = endpoint({
  method: 'GET',
  path: '/digests/:id',
  summary: 'One digest, as it was when it was made',
  access: 'digests.read',
  params: z.strictObject({ id: z.uuid() }),
  reply: z.strictObject({
    id: z.uuid(),
    chainId: z.uuid(),
    madeAt: z.iso.datetime(),
    content: digestContent,
    /** Digests of the same chain for the months beside this one. */
    earlierId: z.uuid().nullable(),
    laterId: z.uuid().nullable(),
  }),
});

export const digestEndpoints = [listDigests, readDigest];
