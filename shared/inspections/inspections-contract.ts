import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { causes, severities } from '../findings/cause';
import { procedureContent } from '../procedures/procedure-content';
import { componentKinds } from '../procedures/step-kind';
import { taskStates } from '../tasks/task-state';

const taskParams = z.strictObject({ id: z.uuid() });

/** What was entered at one step; the step's kind decides which. */
export const reading = z.discriminatedUnion('kind', [
  z.strictObject({ step: z.string(), kind: z.literal('check'), ok: z.boolean() }),
  z.strictObject({ step: z.string(), kind: z.literal('number'), value: z.number() }),
  z.strictObject({ step: z.string(), kind: z.literal('choice'), choice: z.string().max(40) }),
  z.strictObject({ step: z.string(), kind: z.literal('text'), text: z.string().max(2000) }),
  z.strictObject({
    step: z.string(),
    kind: z.literal('photo'),
    photoIds: z.array(z.uuid()).max(12),
  }),
]);

export type StepReading = z.infer<typeof reading>;

export const inspectionDraft = z.strictObject({
  /** Made by the client, so that sending it twice does it once. */
  id: z.uuid(),
  procedureVersionId: z.uuid(),
  startedAt: z.iso.datetime().nullable(),
  note: z.string().trim().max(2000),
  readings: z.array(reading).max(60),
});

const limit = z.strictObject({ low: z.number().nullable(), high: z.number().nullable() });

/** Everything needed to do one task: what to do, on what, within which limits. */
export const taskSheet = z.strictObject({
  task: z.strictObject({
    id: z.uuid(),
    version: z.int(),
    state: z.enum(taskStates),
    audience: z.enum(['technician', 'store']),
    ruleName: z.string(),
    dueOn: z.iso.date(),
    timeZone: z.string(),
    opensAt: z.iso.datetime(),
    closesAt: z.iso.datetime(),
    couldNot: z.string().nullable(),
  }),
  store: z.strictObject({
    id: z.uuid(),
    number: z.string(),
    name: z.string(),
    accessNote: z.string(),
  }),
  unit: z
    .strictObject({ id: z.uuid(), tag: z.string(), kind: z.enum(['built-in', 'portable']) })
    .nullable(),
  procedureVersionId: z.uuid(),
  procedure: procedureContent,
  /** Limits of number steps, by step key, worked out for this unit's own nameplate. */
  limits: z.record(z.string(), limit),
  inspection: z
    .strictObject({
      id: z.uuid(),
      by: z.string(),
      finishedAt: z.iso.datetime(),
      note: z.string(),
      readings: z.array(z.strictObject({ reading, withinLimits: z.boolean().nullable() })),
      /** What the readings out of limit turned into, the gravest first. */
      findings: z.array(
        z.strictObject({
          id: z.uuid(),
          cause: z.enum(causes),
          severity: z.enum(severities),
          componentKind: z.enum(componentKinds).nullable(),
          settled: z.boolean(),
        }),
      ),
    })
    .nullable(),
  mayClose: z.boolean(),
  mayUndo: z.boolean(),
});

export const readTaskSheet = endpoint({
  method: 'GET',
  path: '/tasks/:id/sheet',
  summary: 'The procedure of a task with the limits of its unit, and what was entered',
  access: 'tasks.read',
  params: taskParams,
  reply: taskSheet,
});

export const closeTask = endpoint({
  method: 'PUT',
  path: '/tasks/:id/inspection',
  summary: 'Close a task with its readings; readings out of limit make findings',
  access: 'tasks.do',
  params: taskParams,
  body: inspectionDraft,
  reply: z.strictObject({ state: z.enum(taskStates), findings: z.int() }),
});

export const undoInspection = endpoint({
  method: 'DELETE',
  path: '/tasks/:id/inspection',
  summary: 'Take back the closing of a task; the inspection is kept as undone',
  access: 'tasks.read',
  params: taskParams,
  reply: z.strictObject({ state: z.enum(taskStates) }),
});

export const couldNotReasons = [
  'no-access',
  'in-use',
  'unit-off',
  'part-missing',
  'tool-missing',
  'unsafe',
  'other',
] as const;

export const reportCouldNot = endpoint({
  method: 'POST',
  path: '/tasks/:id/could-not',
  summary: 'Say why a task could not be done; it stays open until someone plans or excuses it',
  access: 'tasks.read',
  params: taskParams,
  body: z.strictObject({ reason: z.enum(couldNotReasons), note: z.string().trim().max(1000) }),
  reply: z.undefined(),
});

export const readTaskHistory = endpoint({
  method: 'GET',
  path: '/tasks/:id/history',
  summary: 'Who did what to a task and when, newest first',
  access: 'tasks.read',
  params: taskParams,
  reply: z.strictObject({
    events: z.array(
      z.strictObject({
        at: z.iso.datetime(),
        /** Null where no person acted: a job did. */
        by: z.string().nullable(),
        action: z.string(),
        reason: z.string().nullable(),
        note: z.string().nullable(),
        /** How many findings the act made. */
        findings: z.int().nullable(),
      }),
    ),
  }),
});

export const inspectionEndpoints = [
  readTaskSheet,
  closeTask,
  undoInspection,
  reportCouldNot,
  readTaskHistory,
];
