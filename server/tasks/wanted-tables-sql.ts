import type { Binds } from '@db/binds';
import type { DueSchedule } from './due-schedules';
import { type TimedOccurrence, keyOf } from './task-timetable';

/** Stands for no key: an ended schedule wants no occurrence. */
const NONE = -1;

/**
 * Two tables of a WITH clause: `batch`, the schedules, and `occurrences`, which belong to a schedule
 * when the keys agree and `local` lies in [from_local, to_local).
 */
export function wantedTables(
  binds: Binds,
  batch: readonly DueSchedule[],
  occurrences: readonly TimedOccurrence[],
): string {
  const keys = new Map([...new Set(batch.map(keyOf))].map((key, index) => [key, index]));
  const array = (type: string, values: readonly unknown[]) => `${binds.add(values)}::${type}[]`;
  const schedule = (type: string, pick: (it: DueSchedule) => unknown) =>
    array(type, batch.map(pick));
  const own = occurrences.filter(({ key }) => keys.has(key));
  const occurrence = (type: string, pick: (it: TimedOccurrence) => unknown) =>
    array(type, own.map(pick));
  const schedules = [
    schedule('uuid', (it) => it.id),
    schedule('int', (it) => (it.ended ? NONE : keys.get(keyOf(it)))),
    schedule('uuid', (it) => it.ruleId),
    schedule('int', (it) => it.revision),
    schedule('uuid', (it) => it.procedureId),
    schedule('uuid', (it) => it.storeId),
    schedule('uuid', (it) => it.unitId),
    schedule('text', (it) => it.audience),
    schedule('text', (it) => it.timeZone),
    schedule('timestamp', (it) => it.fromLocal),
    schedule('timestamp', (it) => it.toLocal),
  ];
  const times = [
    occurrence('int', (it) => keys.get(it.key)),
    occurrence('timestamp', (it) => it.local),
    occurrence('date', (it) => it.dueOn),
    occurrence('date', (it) => it.closesOn),
    occurrence('float8', (it) => it.opensAt),
    occurrence('float8', (it) => it.dueSoonAt),
    occurrence('float8', (it) => it.dueAt),
    occurrence('float8', (it) => it.closesAt),
    occurrence('float8', (it) => it.lapsesAt),
  ];
  return `
    batch AS MATERIALIZED (
      SELECT * FROM unnest(${schedules.join(', ')})
      AS it (id, key, rule_id, revision, procedure_id, store_id, unit_id, audience, time_zone,
        from_local, to_local)),
    occurrences AS MATERIALIZED (
      SELECT key, local, due_on, closes_on, to_timestamp(opens / 1000) AS opens_at,
        to_timestamp(due_soon / 1000) AS due_soon_at, to_timestamp(due / 1000) AS due_at,
        to_timestamp(closes / 1000) AS closes_at, to_timestamp(lapses / 1000) AS lapses_at
      FROM unnest(${times.join(', ')})
      AS it (key, local, due_on, closes_on, opens, due_soon, due, closes, lapses))`;
}
