import * as z from 'zod';
import { readLocalDateTime } from '../calendar/local-date-time';

/** What a wall clock shows, in the store's own zone; a day of the calendar, with seconds. */
export const wallClock = z
  .string()
  .regex(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d$/, 'Write it as 2026-03-08T06:00:00.')
  .refine((text) => readLocalDateTime(text) !== null, 'No such day or time of day.');

export const recurrenceSet = z.strictObject({
  startsLocal: wallClock,
  /** RRULE texts by RFC 5545; what they give is united. */
  rrules: z.array(z.string().trim().min(1).max(500)).max(5),
  rdates: z.array(wallClock).max(400),
  exdates: z.array(wallClock).max(400),
});

const reach = z.int().min(0).max(720);

/** How long a task may be done around its due time; in calendar days, or in hours elapsed. */
export const windowPlan = z.strictObject({
  kind: z.enum(['days', 'hours']),
  before: reach,
  after: reach,
  /** How long it can still be done late; null until the next one opens. */
  late: reach.nullable(),
  dueSoon: reach,
});

export const audiences = ['technician', 'store'] as const;
export const appliesTo = ['unit', 'store'] as const;
export const unitKinds = ['built-in', 'portable'] as const;
export const pumpFaces = ['drain-slot', 'gasket'] as const;

/** One rule: which procedure, whose hands, where, how often, within which window. */
export const ruleDefinition = z.strictObject({
  procedureId: z.uuid(),
  name: z.string().trim().min(1).max(120),
  audience: z.enum(audiences),
  appliesTo: z.enum(appliesTo),
  unitKind: z.enum(unitKinds).nullable(),
  pumpFace: z.enum(pumpFaces).nullable(),
  recurrence: recurrenceSet,
  window: windowPlan,
  /** How many days ahead its tasks are written. */
  horizonDays: z.int().min(1).max(400),
  /** Of rules of one programme at one place, the higher rank covers the lower in its window. */
  rank: z.int().min(0).max(100),
});

export type RuleDefinition = z.infer<typeof ruleDefinition>;
export type Audience = (typeof audiences)[number];
