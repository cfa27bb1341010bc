import * as z from 'zod';
import { dayHours } from '../fleet/store-hours';
import { taskStates } from '../tasks/task-state';
import { routeStates } from './route-state';

/** A task as planning needs it. Days are local to its store. */
export const plannedTask = z.strictObject({
  id: z.uuid(),
  version: z.int(),
  ruleName: z.string(),
  unitTag: z.string().nullable(),
  dueOn: z.iso.date(),
  /** First and last day on which it is done in its window. */
  opensOn: z.iso.date(),
  closesOn: z.iso.date(),
  state: z.enum(taskStates),
  /** What its procedure allows for; null when none is published. */
  minutes: z.int().nullable(),
});

/** A store as a stop: where it is and how to get in. */
export const stop = z.strictObject({
  id: z.uuid(),
  number: z.string(),
  name: z.string(),
  addressLine: z.string(),
  city: z.string(),
  usState: z.string(),
  postalCode: z.string(),
  phone: z.string(),
  accessNote: z.string(),
  latitude: z.number(),
  longitude: z.number(),
  timeZone: z.string(),
});

export const visit = z.strictObject({
  id: z.uuid(),
  version: z.int(),
  /** From 0, in the order of the day. */
  position: z.int(),
  note: z.string(),
  store: stop,
  /** The store's hours and rush windows of that day, local to it; null when it stays closed. */
  hours: dayHours.nullable(),
  /** Straight from the stop before, or from home; null for the first one when no home is known. */
  legMetres: z.number().nullable(),
  /** Sum over its tasks. */
  minutes: z.int(),
  tasks: z.array(plannedTask),
});

export const technician = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  homeKnown: z.boolean(),
});

/** One technician's day in order. */
export const route = z.strictObject({
  id: z.uuid(),
  technician,
  onDate: z.iso.date(),
  state: z.enum(routeStates),
  publishedAt: z.iso.datetime().nullable(),
  version: z.int(),
  visits: z.array(visit),
  /** Visits of the day in stores that the reader does not see. */
  elsewhere: z.int(),
  /** Sum of the legs in sight: straight lines, so less than what is driven. */
  metres: z.number(),
  /** Sum over the visits in sight. */
  minutes: z.int(),
});
