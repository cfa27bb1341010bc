import * as z from 'zod';
import { audiences, unitKinds } from '../programmes/rule-definition';
import { taskStates } from './task-state';

/** Pieces that the contracts of tasks share. */
export const version = z.int().min(0);
export const byId = z.strictObject({ id: z.uuid() });
export const date = z.iso.date();
export const instant = z.iso.datetime();
export const bothLanguages = z.strictObject({ en: z.string(), es: z.string() });

/** What a closed window counts as in compliance; nothing while it has not closed. */
export const windowEnds = ['onTime', 'late', 'notDone', 'excused', 'covered'] as const;

/** How many tasks a list counts and pages through; beyond that it says "more than". */
export const MOST_LISTED = 10_000;

/** Several values of one list: in an address joined by commas, in a body as an array. */
const listOf = <const Values extends readonly [string, ...string[]]>(values: Values) => {
  const array = z.array(z.enum(values)).max(values.length);
  return z.union([
    array,
    z
      .string()
      .transform((text) => text.split(',').filter((it) => it !== ''))
      .pipe(array),
  ]);
};

/** Where and whose: what lists, calendar and board have in common. */
export const placeFilters = {
  /** Words that stand in the store's number or name, the unit's tag or the rule's name. */
  q: z.string().trim().max(100).default(''),
  store: z.uuid().optional(),
  region: z.uuid().optional(),
  chain: z.uuid().optional(),
  rule: z.uuid().optional(),
  technician: z.uuid().optional(),
  audience: z.enum(audiences).optional(),
};

export const taskFilters = {
  ...placeFilters,
  unit: z.uuid().optional(),
  /** With nobody assigned. */
  unassigned: z.enum(['yes', 'no']).optional(),
  state: listOf(taskStates).optional(),
  /** Due on these days, both ends included, by the calendar of each store. */
  from: date.optional(),
  to: date.optional(),
  /** Windows that ended so: what stands behind a figure of compliance. */
  end: listOf(windowEnds).optional(),
  /** Windows that close on these days, both ends included, by the calendar of each store. */
  closesFrom: date.optional(),
  closesTo: date.optional(),
};

export const taskSorts = [
  'due',
  '-due',
  'closes',
  '-closes',
  'store',
  '-store',
  'rule',
  '-rule',
  'technician',
  '-technician',
] as const;

/** How many tasks stand in each state; states without any are left out. */
export const stateCounts = z.partialRecord(z.enum(taskStates), z.int());

export const taskRow = z.strictObject({
  id: z.uuid(),
  version,
  state: z.enum(taskStates),
  /** Null while the window has not closed. */
  end: z.enum(windowEnds).nullable(),
  audience: z.enum(audiences),
  ruleId: z.uuid(),
  ruleName: z.string(),
  procedureId: z.uuid(),
  procedureTitle: bothLanguages,
  storeId: z.uuid(),
  storeNumber: z.string(),
  storeName: z.string(),
  unitId: z.uuid().nullable(),
  unitTag: z.string().nullable(),
  unitKind: z.enum(unitKinds).nullable(),
  /** The store's zone. */
  timeZone: z.string(),
  /** When it is due as the store's clock shows it: `2026-03-08T09:00:00`. */
  dueLocal: z.string(),
  dueOn: date,
  opensAt: instant,
  dueSoonAt: instant,
  dueAt: instant,
  /** End of the window, exclusive. */
  closesAt: instant,
  /** The last local day on which it is on time. */
  closesOn: date,
  /** From here on it can no longer be done; null: it never lapses. */
  lapsesAt: instant.nullable(),
  assignee: z.strictObject({ id: z.uuid(), name: z.string() }).nullable(),
  /** The day of the route it stands on. */
  visitOn: date.nullable(),
  outcomeAt: instant.nullable(),
  outcomeBy: z.string().nullable(),
  outcomeReason: z.string().nullable(),
  /** The day on which it was due before it was deferred. */
  deferredFrom: date.nullable(),
  /** Whether this person may assign, excuse or defer it. */
  mayPlan: z.boolean(),
});
