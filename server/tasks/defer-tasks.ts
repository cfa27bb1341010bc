import { type CalendarDate, daysBetween } from '@shared/calendar/calendar-date';
import type { BodyOf } from '@shared/contract/endpoint';
import { MOST_DAYS_DEFERRED, deferredTimes } from '@shared/tasks/defer-task';
import type { deferTasks as endpoint } from '@shared/tasks/task-changes-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type TaskChange, changeTasks } from './change-tasks';
import type { ChangeableFields, ChangeableTask } from './select-tasks';

/**
 * Puts tasks off to a later day, their windows with them. What has closed is not put off: that would
 * make a miss unhappen; it can be excused, which shows.
 */
export function deferTasks(
  tenant: Tenant,
  actor: Actor,
  { reason, dueOn, ...act }: BodyOf<typeof endpoint>,
  now: Date,
): Promise<TaskChange> {
  const to = dueOn as CalendarDate;
  return changeTasks(
    tenant,
    actor,
    { ...act, kind: 'defer', detail: { reason, dueOn } },
    (task) => {
      if (task.outcome !== 'none') return 'decided';
      if (task.windowKind === 'hours') return 'belongs-to-shift';
      if (now >= task.closesAt) return 'window-closed';
      if (task.onPublishedRoute) return 'on-published-route';
      if (to <= task.dueOn) return 'not-later';
      const first = (task.deferredFrom ?? task.dueOn) as CalendarDate;
      if (daysBetween(first, to) > MOST_DAYS_DEFERRED) return 'too-far';
      return { ...fieldsDeferred(task, to), deferredFrom: first };
    },
    now,
  );
}

function fieldsDeferred(task: ChangeableTask, to: CalendarDate): Partial<ChangeableFields> {
  const times = deferredTimes(
    {
      opensAt: task.opensAt.getTime(),
      dueSoonAt: task.dueSoonAt.getTime(),
      dueAt: task.dueAt.getTime(),
      closesAt: task.closesAt.getTime(),
      lapsesAt: task.lapsesAt.getTime(),
      dueOn: task.dueOn as CalendarDate,
      closesOn: task.closesOn as CalendarDate,
    },
    task.timeZone,
    to,
  );
  return {
    dueOn: times.dueOn,
    closesOn: times.closesOn,
    dueSoonAt: new Date(times.dueSoonAt),
    dueAt: new Date(times.dueAt),
    closesAt: new Date(times.closesAt),
    lapsesAt: new Date(times.lapsesAt),
  };
}
