import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { fileFormat, fileReply } from '../exports/export-format';
import { audiences, windowPlan } from '../programmes/rule-definition';
import { type Month, monthPattern, monthsIn } from './month';
import { windowCounts } from './window-counts';

const month = z
  .string()
  .regex(monthPattern, 'Write a month as 2026-03.')
  .transform((text) => text as Month);

/** Longest range of months that can be asked for at once. */
export const MOST_MONTHS = 36;

/** A share from 0 to 1; null where no window counted, which is not 0 %. */
const rate = z.number().min(0).max(1).nullable();

/** The counts behind a rate, and the same of the equally long range of months just before. */
const figures = {
  counts: windowCounts,
  rate,
  previousCounts: windowCounts,
  previousRate: rate,
  /** Percentage points against the range before. */
  change: z.number().nullable(),
};

export const complianceGroups = ['store', 'region', 'chain', 'rule'] as const;

export const complianceSorts = [
  'name',
  '-name',
  'rate',
  '-rate',
  'change',
  '-change',
  'notDone',
  '-notDone',
] as const;

const range = {
  from: month,
  to: month,
  store: z.uuid().optional(),
  region: z.uuid().optional(),
  chain: z.uuid().optional(),
  rule: z.uuid().optional(),
  audience: z.enum(audiences).optional(),
  /** Part of a store's number or name. */
  q: z.string().trim().max(100).optional(),
};

const inOrder = (query: { from: Month; to: Month }, context: z.RefinementCtx) => {
  const months = monthsIn(query.from, query.to);
  const message =
    months < 1
      ? 'The last month comes before the first.'
      : months > MOST_MONTHS
        ? `At most ${MOST_MONTHS} months at once.`
        : undefined;
  if (message) context.addIssue({ code: 'custom', path: ['to'], message });
};

const table = {
  ...range,
  by: z.enum(complianceGroups).default('store'),
  sort: z.enum(complianceSorts).default('rate'),
};

const paging = {
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(100),
};

export const complianceRow = z.strictObject({
  /** Of the store, region, chain or rule, by what was asked for. */
  id: z.uuid(),
  /** The store's number; null for the other groups. */
  number: z.string().nullable(),
  name: z.string(),
  /** Of a rule: the setting that its rate hangs on. */
  window: windowPlan.nullable(),
  ...figures,
});

export const readCompliance = endpoint({
  method: 'GET',
  path: '/compliance',
  summary: 'On-time rate by store, region, chain or rule over months, with the numbers behind it',
  access: 'compliance.read',
  query: z.strictObject({ ...table, ...paging }).superRefine(inOrder),
  reply: z.strictObject({
    rows: z.array(complianceRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
    totals: z.strictObject(figures),
    /** Until when closed windows have been counted; null before the first count. */
    countedOn: z.iso.date().nullable(),
  }),
});

export const readCompliancePicture = endpoint({
  method: 'GET',
  path: '/compliance/picture',
  summary: 'On-time rate by store and month',
  access: 'compliance.read',
  query: z.strictObject({ ...range, ...paging }).superRefine(inOrder),
  reply: z.strictObject({
    months: z.array(z.string()),
    rows: z.array(
      z.strictObject({
        storeId: z.uuid(),
        number: z.string(),
        name: z.string(),
        rate,
        /** One for each month; a month without any closed window has counts of nothing. */
        cells: z.array(z.strictObject({ counts: windowCounts, rate })),
      }),
    ),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const exportCompliance = endpoint({
  method: 'GET',
  path: '/compliance/export',
  summary: 'The compliance table as CSV or XLSX',
  access: 'compliance.read',
  query: z.strictObject({ ...table, ...fileFormat }).superRefine(inOrder),
  reply: fileReply,
});

const named = z.strictObject({ id: z.uuid(), name: z.string() });

/** The words for what can be filtered by; only what lies in the reader's sight. */
export const readComplianceFilters = endpoint({
  method: 'GET',
  path: '/compliance/filters',
  summary: 'Chains, regions and rules to filter compliance by, and the name of one store',
  access: 'compliance.read',
  query: z.strictObject({ store: z.uuid().optional() }),
  reply: z.strictObject({
    chains: z.array(named),
    regions: z.array(named),
    rules: z.array(named),
    /** The store that was asked for; null when none was, or it is out of sight. */
    store: named.extend({ number: z.string() }).nullable(),
  }),
});

export const complianceEndpoints = [readCompliance, readCompliancePicture, readComplianceFilters];
