import { addDays, type CalendarDate } from '@shared/calendar/calendar-date';
import { fateOf } from './habits';
import { HistoryRows } from './history-rows';
import { recordInspection } from './record-inspection';
import type { HistoryTask, HistoryWorld, StoreLife } from './history-world';
import { repairStore } from './repair-store';
import { liveDay } from './unit-condition';

/** How far ahead technicians' tasks have a name on them; what lies beyond is still to be planned. */
const ASSIGNED_DAYS = 12;

/**
 * Lives through the tasks in the order in which they were due: crews keep or skip their paper checks,
 * parts wear by it, technicians find what wore and repair it. Nothing here reads a clock or chance of
 * its own, so that the same day makes the same world.
 *
 * @param tasks in order of due date, each store's and unit's own
 */
export function simulateHistory(
  world: HistoryWorld,
  tasks: readonly HistoryTask[],
  random: () => number,
  now: Date,
): HistoryRows {
  const rows = new HistoryRows();
  const today = now.toISOString().slice(0, 10) as CalendarDate;
  for (const task of tasks) {
    const store = world.stores.get(task.storeId);
    if (!store) continue;
    livesUntil(store, task.dueOn < today ? task.dueOn : today, rows, world, random);
    settleTask(world, store, task, rows, random, now);
  }
  for (const store of world.stores.values()) {
    repairStore(world, store, now, rows);
  }
  return rows;
}

/** Wears every unit of a store day by day, and repairs those whose repair has come. */
function livesUntil(
  store: StoreLife,
  day: CalendarDate,
  rows: HistoryRows,
  world: HistoryWorld,
  random: () => number,
): void {
  while (store.day < day) {
    store.day = addDays(store.day, 1);
    const missed = store.missedChecks;
    store.missedChecks = 0;
    for (const unit of store.units) liveDay(unit.condition, missed, random);
    repairStore(world, store, new Date(`${store.day}T18:00:00Z`), rows);
    if (store.waterDay === store.day) {
      const [first] = store.units;
      if (first) first.condition.rust = true;
      store.waterGotIn = true;
    }
  }
}

function settleTask(
  world: HistoryWorld,
  store: StoreLife,
  task: HistoryTask,
  rows: HistoryRows,
  random: () => number,
  now: Date,
): void {
  const technical = task.audience === 'technician';
  const unit = store.units.find(({ id }) => id === task.unitId);
  const fate = task.opensAt >= now ? null : fateOf(task, reliability(store, task), random, now);
  const soon = task.dueAt.getTime() < now.getTime() + ASSIGNED_DAYS * 86_400_000;
  const planned = technical && soon && random() < store.plannedAhead;
  const assignedTo = technical && (task.closesAt < now || planned) ? store.technicianId : null;
  if (!fate || fate.kind === 'left') {
    const couldNot = fate?.couldNot ?? null;
    if (task.code === 'shift-paper' && task.closesAt < now) store.missedChecks += 1;
    if (!assignedTo && !couldNot) return;
    rows.outcomes.push(outcome(task, 'none', null, null, couldNot, assignedTo));
    return;
  }
  if (fate.kind === 'excused') {
    rows.outcomes.push(outcome(task, 'excused', fate.at, store.plannerId, fate.reason, assignedTo));
    rows.event(fate.at, store.plannerId, task.id, 'excused', { reason: fate.reason });
    return;
  }
  const by = technical ? store.technicianId : store.managerId;
  rows.outcomes.push(outcome(task, 'done', fate.at, by, null, technical ? by : null));
  recordInspection({ world, store, unit, task, by, at: fate.at, random }, rows);
}

/** Crews forget more of the small checks than of the rare ones. */
function reliability(store: StoreLife, { audience, code }: HistoryTask): number {
  if (audience === 'technician') return store.technicianReliability;
  return code === 'shift-paper' ? store.discipline : Math.sqrt(store.discipline);
}

function outcome(
  { id, occursLocal }: HistoryTask,
  kind: 'none' | 'done' | 'excused',
  at: Date | null,
  by: string | null,
  reason: string | null,
  assignedTo: string | null,
) {
  return { id, occursLocal, outcome: kind, at, by, reason, assignedTo };
}
