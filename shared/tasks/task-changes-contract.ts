import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { byId, date, instant, taskFilters, version } from './task-parts';

/** How many tasks can be changed at once. */
export const MOST_CHANGED = 2_000;

/** Which tasks: those ticked, at the version that was seen, or all that a filter finds now. */
export const taskSelection = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('tasks'),
    tasks: z
      .array(z.strictObject({ id: z.uuid(), version }))
      .min(1, 'Choose at least one task.')
      .max(MOST_CHANGED, `At most ${MOST_CHANGED} tasks at once.`),
  }),
  z.strictObject({
    kind: z.literal('matching'),
    filters: z.strictObject(taskFilters),
    /** How many the person saw; refused when there are more by now. */
    seen: z.int().min(1).max(MOST_CHANGED, `At most ${MOST_CHANGED} tasks at once.`),
  }),
]);

/** Why a task was left as it was. */
export const leftReasons = [
  'not-found',
  'not-allowed',
  'changed-meanwhile',
  'already-so',
  /** Done, excused or covered. */
  'decided',
  /** It can no longer be done, even late. */
  'lapsed',
  /** Only tasks of technicians are assigned. */
  'for-the-store',
  /** The person does not work as a technician at that store. */
  'not-their-store',
  /** On a published route: the visit must be moved instead. */
  'on-published-route',
  /** Its window has closed: deferring would rewrite what it counted as. */
  'window-closed',
  /** A check of a shift belongs to its hours. */
  'belongs-to-shift',
  /** The new day is not after the one on which it is due. */
  'not-later',
  /** Further than ninety days after the day on which it was first due. */
  'too-far',
] as const;

export const taskChange = z.strictObject({
  /** What to name to take it back. */
  id: z.uuid(),
  kind: z.enum(['assign', 'excuse', 'defer']),
  madeAt: instant,
  undoneAt: instant.nullable(),
  changed: z.int(),
  /** For every task chosen, in their order of closing. */
  results: z.array(
    z.strictObject({
      taskId: z.uuid(),
      /** Missing where the task is not in sight. */
      storeNumber: z.string().nullable(),
      unitTag: z.string().nullable(),
      ruleName: z.string().nullable(),
      dueOn: date.nullable(),
      changed: z.boolean(),
      /** Null where it was changed. */
      left: z.enum(leftReasons).nullable(),
    }),
  ),
});

const change = {
  /** Made by the client, so that sending it twice does it once. */
  id: z.uuid(),
  selection: taskSelection,
};
const reason = z.string().trim().min(1, 'Say why.').max(500);

export const assignTasks = endpoint({
  method: 'POST',
  path: '/tasks/assign',
  summary: 'Give tasks to a technician, or to nobody',
  access: 'tasks.plan',
  body: z.strictObject({
    ...change,
    technicianId: z.uuid().nullable(),
    reason: z.string().trim().max(500).default(''),
  }),
  reply: taskChange,
});

export const excuseTasks = endpoint({
  method: 'POST',
  path: '/tasks/excuse',
  summary: 'Say that tasks need not be done: they leave the on-time rate on both sides',
  access: 'tasks.plan',
  body: z.strictObject({ ...change, reason }),
  reply: taskChange,
});

export const deferTasks = endpoint({
  method: 'POST',
  path: '/tasks/defer',
  summary: 'Move the due day of tasks to a later one, their window with it',
  access: 'tasks.plan',
  body: z.strictObject({ ...change, reason, dueOn: date }),
  reply: taskChange,
});

export const undoTaskChange = endpoint({
  method: 'POST',
  path: '/tasks/changes/:id/undo',
  summary: 'Take back an assignment, excuse or deferral where nothing happened to the task since',
  access: 'tasks.plan',
  params: byId,
  reply: taskChange,
});

export const taskChangesEndpoints = [assignTasks, excuseTasks, deferTasks, undoTaskChange];
