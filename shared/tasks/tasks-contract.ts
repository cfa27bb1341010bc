import * as z from 'zod';
import { isMonth } from '../compliance/month';
import { endpoint } from '../contract/endpoint';
import { fileFormat, fileReply } from '../exports/export-format';
import { windowPlan } from '../programmes/rule-definition';
import {
  MOST_LISTED,
  bothLanguages,
  byId,
  date,
  instant,
  placeFilters,
  stateCounts,
  taskFilters,
  taskRow,
  taskSorts,
} from './task-parts';

const sorted = { ...taskFilters, sort: z.enum(taskSorts).default('due') };

export const listTasks = endpoint({
  method: 'GET',
  path: '/tasks',
  summary: 'Tasks in sight',
  access: 'tasks.read',
  query: z
    .strictObject({
      ...sorted,
      page: z.coerce.number().int().min(1).default(1),
      pageSize: z.coerce.number().int().min(1).max(200).default(50),
    })
    .refine(({ page, pageSize }) => page * pageSize <= MOST_LISTED + pageSize, {
      path: ['page'],
      message: `A list goes up to ${MOST_LISTED} tasks: narrow it by filters.`,
    }),
  reply: z.strictObject({
    rows: z.array(taskRow),
    /** How many there are, counted up to 10,000. */
    total: z.int(),
    /** Whether there are more than `total`. */
    more: z.boolean(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const exportTasks = endpoint({
  method: 'GET',
  path: '/tasks/export',
  summary: 'The tasks of a list, as a file',
  access: 'tasks.read',
  query: z.strictObject({ ...sorted, ...fileFormat }),
  reply: fileReply,
});

export const readTask = endpoint({
  method: 'GET',
  path: '/tasks/:id',
  summary: 'One task',
  access: 'tasks.read',
  params: byId,
  reply: taskRow,
});

export const readTaskCalendar = endpoint({
  method: 'GET',
  path: '/tasks/calendar',
  summary: 'How many tasks stand in which state on each day of a month, by the day they are due',
  access: 'tasks.read',
  query: z.strictObject({
    ...placeFilters,
    unit: z.uuid().optional(),
    month: z.string().refine(isMonth, 'Write a month as 2026-03.'),
    /** Gives the tasks of this day along. */
    day: date.optional(),
  }),
  reply: z.strictObject({
    month: z.string(),
    /** Today in the zone of whoever asks. */
    today: date,
    /** Every day of the month, in order. */
    days: z.array(z.strictObject({ date, total: z.int(), counts: stateCounts })),
    /** Of the day asked for, the earliest due first, 200 at most. */
    tasks: z.array(taskRow),
  }),
});

export const boardSorts = [
  'number',
  '-number',
  'name',
  '-name',
  'rate',
  '-rate',
  'overdue',
] as const;

/** Weeks in the strip beside a store's name, and weeks of days on the board. */
export const STRIP_WEEKS = 13;
export const BOARD_WEEKS = 5;

const rate = z.number().min(0).max(1).nullable();

export const readTaskBoard = endpoint({
  method: 'GET',
  path: '/tasks/board',
  summary: 'Stores by days over five weeks: which states the tasks of each cell stand in',
  access: 'board.read',
  query: z.strictObject({
    ...placeFilters,
    /** A day of the first week, which begins on its Monday; without one the week two weeks back. */
    from: date.optional(),
    sort: z.enum(boardSorts).default('number'),
    page: z.coerce.number().int().min(1).max(10_000).default(1),
    pageSize: z.coerce.number().int().min(1).max(100).default(50),
  }),
  reply: z.strictObject({
    from: date,
    to: date,
    /** Today in the zone of whoever asks. */
    today: date,
    rows: z.array(
      z.strictObject({
        storeId: z.uuid(),
        number: z.string(),
        name: z.string(),
        /** Today by the store's own calendar. */
        today: date,
        /** Over the weeks of the strip. */
        rate,
        /** On-time rate of each of the last thirteen weeks, the oldest first. */
        weeks: z.array(rate),
        /** Tasks past their window, not lapsed yet, whenever they were due. */
        overdue: z.int(),
        /** Days that have tasks, in order of date; a task stands on the day it is due. */
        cells: z.array(z.strictObject({ date, counts: stateCounts })),
      }),
    ),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
    /** Over all stores of the filters, not the page alone. */
    figures: z.strictObject({
      rate,
      /** The numbers behind the rate. */
      onTime: z.int(),
      counted: z.int(),
      overdue: z.int(),
      /** The last day on which the oldest overdue task was on time. */
      oldestOverdueOn: date.nullable(),
      /** Not decided yet and due from today to the end of this week, a Sunday. */
      dueThisWeek: z.int(),
    }),
  }),
});

export const explainTask = endpoint({
  method: 'GET',
  path: '/tasks/:id/why',
  summary: 'Why a task is here: rule and revision, occurrence, window, and what was changed since',
  access: 'tasks.read',
  params: byId,
  reply: z.strictObject({
    /** The whole of it in sentences, to be read from top to bottom. */
    sentences: z.strictObject({ en: z.array(z.string()), es: z.array(z.string()) }),
    rule: z.strictObject({
      id: z.uuid(),
      name: z.string(),
      programmeId: z.uuid(),
      programmeName: z.string(),
      /** The revision the task follows. */
      revision: z.int(),
      /** The one in force now. */
      currentRevision: z.int(),
      /** The recurrence of the task's revision in words. */
      words: bothLanguages,
      madeAt: instant.nullable(),
      madeBy: z.string().nullable(),
    }),
    /** When the rule made it occur, by the store's clock: `2026-03-08T09:00:00`. */
    occursLocal: z.string(),
    timeZone: z.string(),
    /** The setting of the window in the task's revision. */
    window: windowPlan,
    /** From which day on the place stands under the rule. */
    scheduleFrom: date,
    scheduleEndedAt: instant.nullable(),
    deferredFrom: date.nullable(),
    /** What people did with it, the latest first, fifty at most. */
    events: z.array(z.strictObject({ at: instant, by: z.string().nullable(), action: z.string() })),
  }),
});

export const tasksEndpoints = [
  listTasks,
  exportTasks,
  readTaskCalendar,
  readTaskBoard,
  readTask,
  explainTask,
];
