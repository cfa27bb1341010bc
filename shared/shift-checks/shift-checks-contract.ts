import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { inspectionDraft, taskSheet } from '../inspections/inspections-contract';

export const readShift = endpoint({
  method: 'GET',
  path: '/shift',
  summary: 'The checks of a store that wait for acknowledgement now, and those done today',
  access: 'shift.read',
  query: z.strictObject({ store: z.uuid().optional() }),
  reply: z.strictObject({
    stores: z.array(z.strictObject({ id: z.uuid(), number: z.string(), name: z.string() })),
    storeId: z.uuid().nullable(),
    timeZone: z.string().nullable(),
    /** Open now, soonest closing first. */
    waiting: z.array(taskSheet),
    done: z.array(
      z.strictObject({
        taskId: z.uuid(),
        ruleName: z.string(),
        by: z.string(),
        at: z.iso.datetime(),
        onTime: z.boolean(),
      }),
    ),
    /** Published visits of the next two weeks, the first one first. */
    visits: z.array(
      z.strictObject({
        id: z.uuid(),
        onDate: z.iso.date(),
        technician: z.string(),
        note: z.string(),
        tasks: z.int(),
        minutes: z.int(),
      }),
    ),
  }),
});

export const acknowledge = endpoint({
  method: 'POST',
  path: '/shift/acknowledgements',
  summary: 'Acknowledge checks of a shift in the name of the person signed in',
  access: 'tasks.acknowledge',
  body: z.strictObject({
    checks: z
      .array(z.strictObject({ taskId: z.uuid(), inspection: inspectionDraft }))
      .min(1)
      .max(30),
  }),
  reply: z.strictObject({ acknowledged: z.int(), findings: z.int() }),
});

export const shiftCheckEndpoints = [readShift, acknowledge];
