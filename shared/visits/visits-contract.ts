import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { plannedTask, route, stop, technician } from './route-parts';

const params = z.strictObject({ id: z.uuid() });
const version = z.int().min(0);
const note = z.string().trim().max(500);
const days = z.coerce.number().int().min(1).max(31).default(1);

/** The planner's desk: who can be sent, and what each day holds so far. */
export const readPlan = endpoint({
  method: 'GET',
  path: '/routes',
  summary: 'Technicians and their routes from a day on',
  access: 'visits.plan',
  query: z.strictObject({
    from: z.iso.date(),
    days,
    technician: z.uuid().optional(),
    region: z.uuid().optional(),
  }),
  reply: z.strictObject({ technicians: z.array(technician), routes: z.array(route) }),
});

export const readRoute = endpoint({
  method: 'GET',
  path: '/routes/:id',
  summary: 'One technician’s day',
  access: 'visits.plan',
  params,
  reply: route,
});

/** Stores with technicians’ tasks that are in no visit yet. */
export const listUnplanned = endpoint({
  method: 'GET',
  path: '/visits/unplanned',
  summary: 'Work without a visit, by store, what closes first on top',
  access: 'visits.plan',
  query: z.strictObject({
    q: z.string().trim().max(100).default(''),
    /** Tasks whose window opens by this day. */
    by: z.iso.date(),
    region: z.uuid().optional(),
    chain: z.uuid().optional(),
    sort: z.enum(['closesOn', '-tasks', 'store']).default('closesOn'),
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(
      z.strictObject({
        store: stop,
        chainName: z.string(),
        regionName: z.string(),
        /** The earliest last day of a window. */
        closesOn: z.iso.date(),
        overdue: z.int(),
        minutes: z.int(),
        tasks: z.array(plannedTask),
      }),
    ),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

/** Published visits of stores: who comes when. */
export const listComing = endpoint({
  method: 'GET',
  path: '/visits/coming',
  summary: 'Who comes to the stores in sight, and when',
  access: 'visits.read',
  query: z.strictObject({ from: z.iso.date(), days, store: z.uuid().optional() }),
  reply: z.strictObject({
    visits: z.array(
      z.strictObject({
        id: z.uuid(),
        onDate: z.iso.date(),
        store: stop,
        technicianName: z.string(),
        /** Stop of the technician’s day, from 1. */
        place: z.int(),
        stops: z.int(),
        /** True when the day was changed after it was told: it may still move. */
        changed: z.boolean(),
        minutes: z.int(),
        done: z.int(),
        tasks: z.array(plannedTask),
      }),
    ),
  }),
});

/** Puts a store’s tasks on a technician’s day; a visit that is there already takes them on. */
export const addVisit = endpoint({
  method: 'POST',
  path: '/visits',
  summary: 'Bundle open tasks of a store into a visit',
  access: 'visits.plan',
  body: z.strictObject({
    id: z.uuid(),
    storeId: z.uuid(),
    technicianId: z.uuid(),
    onDate: z.iso.date(),
    taskIds: z.array(z.uuid()).min(1).max(200),
    note: note.default(''),
    /** Where in the day’s order; at the end when left out. */
    position: z.int().min(0).max(1000).optional(),
  }),
  reply: route,
});

export const editVisit = endpoint({
  method: 'PATCH',
  path: '/visits/:id',
  summary: 'Change a visit’s note or its tasks',
  access: 'visits.plan',
  params,
  body: z.strictObject({
    version,
    note: note.optional(),
    /** All that stay or come; what is left out goes back to unplanned work. */
    taskIds: z.array(z.uuid()).min(1).max(200).optional(),
  }),
  reply: route,
});

/** A visit that the other day already has at that store takes the tasks on. */
export const moveVisit = endpoint({
  method: 'POST',
  path: '/visits/:id/move',
  summary: 'Give a visit to another technician or day',
  access: 'visits.plan',
  params,
  body: z.strictObject({
    version,
    technicianId: z.uuid(),
    onDate: z.iso.date(),
    position: z.int().min(0).max(1000).optional(),
  }),
  reply: route,
});

export const removeVisit = endpoint({
  method: 'DELETE',
  path: '/visits/:id',
  summary: 'Take a visit off; its tasks are unplanned again',
  access: 'visits.plan',
  params,
  body: z.strictObject({ version }),
  reply: route,
});

export const orderRoute = endpoint({
  method: 'PUT',
  path: '/routes/:id/order',
  summary: 'Put the visits of a day in order',
  access: 'visits.plan',
  params,
  body: z.strictObject({ version, visitIds: z.array(z.uuid()).max(200) }),
  reply: route,
});

export const orderNearestNext = endpoint({
  method: 'POST',
  path: '/routes/:id/nearest-next',
  summary: 'Order a day from home to the nearest stop, and from each to the nearest left',
  access: 'visits.plan',
  params,
  body: z.strictObject({ version }),
  reply: route,
});

export const publishRoute = endpoint({
  method: 'POST',
  path: '/routes/:id/publish',
  summary: 'Show a day to its technician and its stores',
  access: 'visits.plan',
  params,
  body: z.strictObject({ version }),
  reply: route,
});

export const visitsEndpoints = [
  readPlan,
  readRoute,
  listUnplanned,
  listComing,
  addVisit,
  editVisit,
  moveVisit,
  removeVisit,
  orderRoute,
  orderNearestNext,
  publishRoute,
];
