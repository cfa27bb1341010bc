import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { fileFormat, fileReply } from '../exports/export-format';
import { componentKinds } from '../procedures/step-kind';
import { causes, severities } from './cause';

const params = z.strictObject({ id: z.uuid() });

export const finding = z.strictObject({
  id: z.uuid(),
  version: z.int(),
  storeId: z.uuid(),
  storeNumber: z.string(),
  storeName: z.string(),
  timeZone: z.string(),
  unitId: z.uuid().nullable(),
  unitTag: z.string().nullable(),
  componentKind: z.enum(componentKinds).nullable(),
  cause: z.enum(causes),
  severity: z.enum(severities),
  note: z.string(),
  photoIds: z.array(z.uuid()),
  foundAt: z.iso.datetime(),
  foundBy: z.string(),
  taskId: z.uuid().nullable(),
  settledAt: z.iso.datetime().nullable(),
  settledBy: z.string().nullable(),
  settledNote: z.string().nullable(),
});

export const findingSorts = [
  'foundAt',
  '-foundAt',
  'severity',
  '-severity',
  'store',
  '-store',
] as const;

export const findingFilters = {
  q: z.string().max(100).optional(),
  store: z.uuid().optional(),
  region: z.uuid().optional(),
  chain: z.uuid().optional(),
  unit: z.uuid().optional(),
  cause: z.enum(causes).optional(),
  severity: z.enum(severities).optional(),
  settled: z.enum(['yes', 'no']).optional(),
  from: z.iso.date().optional(),
  to: z.iso.date().optional(),
  sort: z.enum(findingSorts).default('-foundAt'),
};

export const listFindings = endpoint({
  method: 'GET',
  path: '/findings',
  summary: 'What inspections and stores found',
  access: 'findings.read',
  query: z.strictObject({
    ...findingFilters,
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(finding),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const exportFindings = endpoint({
  method: 'GET',
  path: '/findings/export',
  summary: 'The findings of a list as a file',
  access: 'findings.read',
  query: z.strictObject({ ...findingFilters, ...fileFormat }),
  reply: fileReply,
});

export const readFinding = endpoint({
  method: 'GET',
  path: '/findings/:id',
  summary: 'One finding',
  access: 'findings.read',
  params,
  reply: finding,
});

export const reportFinding = endpoint({
  method: 'POST',
  path: '/findings',
  summary: 'Report trouble with a unit or in a store',
  access: 'findings.report',
  body: z.strictObject({
    id: z.uuid(),
    storeId: z.uuid(),
    unitId: z.uuid().nullable(),
    componentKind: z.enum(componentKinds).nullable(),
    cause: z.enum(causes),
    severity: z.enum(severities),
    note: z.string().trim().min(1, 'Say what you saw.').max(2000),
    photoIds: z.array(z.uuid()).max(12),
  }),
  reply: finding,
});

/** What was done about a finding: a repair with parts and labour, or only a word. */
export const settleFinding = endpoint({
  method: 'POST',
  path: '/findings/:id/settlement',
  summary: 'Settle a finding, with the repair that settled it',
  access: 'findings.settle',
  params,
  body: z.strictObject({
    version: z.int(),
    note: z.string().trim().min(1, 'Say what was done.').max(2000),
    repair: z
      .strictObject({
        id: z.uuid(),
        cause: z.enum(causes),
        /** Kinds replaced; a new component of the kind is installed that day. */
        replaced: z.array(z.enum(componentKinds)).max(4),
        minutes: z.int().min(0).max(1440).nullable(),
        partsCents: z.int().min(0).max(100_000_000),
        labourCents: z.int().min(0).max(100_000_000),
      })
      .nullable(),
  }),
  reply: finding,
});

export const reopenFinding = endpoint({
  method: 'DELETE',
  path: '/findings/:id/settlement',
  summary: 'Take back a settlement that recorded no repair',
  access: 'findings.settle',
  params,
  body: z.strictObject({ version: z.int() }),
  reply: finding,
});

export const findingEndpoints = [
  listFindings,
  exportFindings,
  readFinding,
  reportFinding,
  settleFinding,
  reopenFinding,
];
