import { lastDayOf } from '@shared/compliance/month';
import type { WindowCounts } from '@shared/compliance/on-time-rate';
import type { Months } from './month-choice';

export type WindowEnd = keyof WindowCounts;

/** Filters of the compliance page that the list of tasks knows by the same names. */
const passedOn = ['store', 'region', 'chain', 'rule', 'audience', 'q'] as const;

export type PlaceFilters = Readonly<Partial<Record<(typeof passedOn)[number], string>>>;

/** The windows that a rate is out of. */
export const countedEnds: readonly WindowEnd[] = ['onTime', 'late', 'notDone'];

/**
 * The query of `/tasks` that lists the tasks behind a figure: those whose window closed in the months
 * and ended as given, within the filters set.
 *
 * @example
 * tasksBehind(['late'], { from: '2026-03', to: '2026-03' }, { store: id })
 * // { store: id, end: 'late', closesFrom: '2026-03-01', closesTo: '2026-03-31', sort: 'closes' }
 */
export function tasksBehind(
  ends: readonly WindowEnd[],
  { from, to }: Months,
  filters: PlaceFilters,
): Readonly<Record<string, string>> {
  const place = passedOn.flatMap((name) => {
    const value = filters[name];
    return value ? [[name, value] as const] : [];
  });
  return {
    ...Object.fromEntries(place),
    end: ends.join(','),
    closesFrom: `${from}-01`,
    closesTo: lastDayOf(to),
    sort: 'closes',
  };
}
