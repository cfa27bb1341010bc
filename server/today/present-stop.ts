import type { ReplyOf } from '@shared/contract/endpoint';
import type { CalendarDate } from '@shared/calendar/calendar-date';
import { weekdayOf } from '@shared/calendar/calendar-date';
import { hoursOfDay, unknownHours, weekdays } from '@shared/fleet/store-hours';
import type { LocalizedText } from '@shared/procedures/procedure-content';
import type { readToday } from '@shared/today/today-contract';
import type { TodayStoreRow, TodayTaskRow } from './today-tasks';

type Stop = ReplyOf<typeof readToday>['visits'][number];

/** States in which work is left. */
const waiting = new Set(['open', 'due-soon', 'overdue']);

/** One store of the day: its tasks, the minutes that are left and what to bring for them. */
export function presentStop(
  store: TodayStoreRow,
  visit: { readonly id: string; readonly note: string } | null,
  tasks: readonly TodayTaskRow[],
  date: CalendarDate,
): Stop {
  const left = tasks.filter(({ state }) => waiting.has(state));
  const { hours, ...known } = store;
  return {
    visitId: visit?.id ?? null,
    note: visit?.note ?? '',
    store: { ...known, rush: rushOf(hours, date) },
    minutes: left.reduce((sum, { minutes }) => sum + minutes, 0),
    tools: once(left.flatMap(({ tools }) => tools)),
    parts: once(left.flatMap(({ parts }) => parts)),
    tasks: tasks.map((task) => ({
      id: task.id,
      unitTag: task.unitTag,
      title: task.title,
      state: task.state,
      dueOn: task.dueOn,
      opensAt: task.opensAt.toISOString(),
      closesAt: task.closesAt.toISOString(),
      minutes: task.minutes,
      cautions: task.cautions,
      couldNot: task.couldNot,
    })),
  };
}

function rushOf(hours: TodayStoreRow['hours'], date: CalendarDate): Stop['store']['rush'] {
  const weekday = weekdays[weekdayOf(date)] ?? 'MO';
  return hoursOfDay({ ...unknownHours, ...hours }, weekday)?.rush ?? [];
}

/** The same tool asked for by several tasks is brought once. */
function once(things: readonly LocalizedText[]): LocalizedText[] {
  return [...new Map(things.map((thing) => [thing.en, thing])).values()];
}
