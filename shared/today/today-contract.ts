import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { dayHours } from '../fleet/store-hours';
import { localizedText } from '../procedures/procedure-content';
import { taskStates } from '../tasks/task-state';

/** A task as a line of the day: what it is, how it stands, how long it takes. */
export const todayTask = z.strictObject({
  id: z.uuid(),
  unitTag: z.string().nullable(),
  title: localizedText,
  state: z.enum(taskStates),
  dueOn: z.iso.date(),
  opensAt: z.iso.datetime(),
  closesAt: z.iso.datetime(),
  minutes: z.int(),
  /** Cautions of the procedure and of its steps. */
  cautions: z.int(),
  /** Why it could not be done at the last try. */
  couldNot: z.string().nullable(),
});

/** One store of the day with its tasks. */
export const todayStop = z.strictObject({
  /** Null where the tasks stand on no visit. */
  visitId: z.uuid().nullable(),
  note: z.string(),
  store: z.strictObject({
    id: z.uuid(),
    number: z.string(),
    name: z.string(),
    address: z.string(),
    phone: z.string(),
    accessNote: z.string(),
    timeZone: z.string(),
    /** Wall-clock times of the store on that day in which nobody may work on the line. */
    rush: dayHours.shape.rush,
  }),
  /** Work that is left, without the drive. */
  minutes: z.int(),
  tools: z.array(localizedText),
  parts: z.array(localizedText),
  tasks: z.array(todayTask),
});

export const readToday = endpoint({
  method: 'GET',
  path: '/today',
  summary: 'A technician’s day: the visits in order, then what is due and on no visit, by store',
  access: 'today.read',
  reply: z.strictObject({
    /** The day in the technician’s own zone. */
    date: z.iso.date(),
    timeZone: z.string(),
    /** Whether a route was published for this day. */
    published: z.boolean(),
    visits: z.array(todayStop),
    unplanned: z.array(todayStop),
    /** Due tasks beyond those listed. */
    more: z.int(),
  }),
});

export const todayEndpoints = [readToday];
