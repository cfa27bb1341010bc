import type { QueryOf } from '@shared/contract/endpoint';
import type { readCompliancePicture } from '@shared/compliance/compliance-contract';
import { addToMonth, lastDayOf, type Month, monthsIn } from '@shared/compliance/month';
import type { Binds } from '@db/binds';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

type Filters = Omit<QueryOf<typeof readCompliancePicture>, 'page' | 'pageSize'>;

/** Days on which windows closed, both ends included, `YYYY-MM-DD`. */
export interface DayRange {
  readonly from: string;
  readonly to: string;
}

/** The days of a range of months. */
export const daysOf = (from: Month, to: Month): DayRange => ({
  from: `${from}-01`,
  to: lastDayOf(to),
});

/** The range of as many months just before. */
export function daysBefore(from: Month, to: Month): DayRange {
  return daysOf(addToMonth(from, -monthsIn(from, to)), addToMonth(from, -1));
}

/**
 * SQL that is true for the rows of `compliance_months` (d) joined to `stores` (s) and `rules` (r) that
 * the actor may see and asked for, whatever the months.
 */
export function complianceFilter(actor: Actor, query: Filters, binds: Binds): string {
  const all = [visibleStores(actor, 'compliance.read', binds)];
  const equal = (column: string, value: string | undefined) => {
    if (value !== undefined) all.push(`${column} = ${binds.add(value)}`);
  };
  equal('d.store_id', query.store);
  equal('s.region_id', query.region);
  equal('s.chain_id', query.chain);
  equal('d.rule_id', query.rule);
  equal('r.audience', query.audience);
  if (query.q) {
    const like = binds.add(`%${query.q.replace(/[\\%_]/g, '\\$&')}%`);
    all.push(`s.number || ' ' || s.name ILIKE ${like}`);
  }
  return all.join(' AND ');
}

export const complianceFrom = `
  FROM compliance_months d JOIN stores s ON s.id = d.store_id JOIN rules r ON r.id = d.rule_id`;

/** The five sums of the months of which `when` is true, as one JSON value of the counts' own names. */
export function sums(when: string): string {
  const sum = (column: string) => `coalesce(sum(d.${column}) FILTER (WHERE ${when}), 0)::int`;
  return `jsonb_build_object('onTime', ${sum('on_time')}, 'late', ${sum('late')},
    'notDone', ${sum('not_done')}, 'excused', ${sum('excused')}, 'covered', ${sum('covered')})`;
}

/** The rate of the months of which `when` is true, for sorting; what is shown is made from the sums. */
export function rateSql(when: string): string {
  return `sum(d.on_time) FILTER (WHERE ${when})::float
    / nullif(sum(d.on_time + d.late + d.not_done) FILTER (WHERE ${when}), 0)`;
}
