import type { Tenant } from '@db/tenant-transaction';
import { MOST_DAYS_DEFERRED } from '@shared/tasks/defer-task';

/** Between which days tasks occur that can be done now, as bounds that follow from all windows. */
export interface OpenSpan {
  /** Null where some window stays open until the next one, however long that is. */
  readonly earliest: string | null;
  readonly latest: string;
}

/** A day either side, as the store's day may be another one. */
const SLACK = 2;

/**
 * The span in which tasks occur that have opened and not lapsed at `now`, by the longest windows that
 * any revision of any rule ever had. It spares a statement every other month of tasks, which it would
 * have to plan for at least.
 */
export async function openSpan(tenant: Tenant, now: Date): Promise<OpenSpan> {
  const span = await tenant.row<OpenSpan>(
    `SELECT CASE WHEN bool_or(late IS NULL) THEN NULL
         ELSE ($1::timestamptz)::date - (max(after + late) + ${MOST_DAYS_DEFERRED + SLACK})::int END
         AS earliest,
       ($1::timestamptz)::date + (max(before) + ${SLACK})::int AS latest
     FROM (
       SELECT ceil((w ->> 'before')::numeric / unit) AS before,
         ceil((w ->> 'after')::numeric / unit) AS after,
         CASE WHEN w ->> 'late' IS NOT NULL THEN ceil((w ->> 'late')::numeric / unit) END AS late
       FROM (SELECT time_window AS w FROM rules
         UNION SELECT definition -> 'window' FROM rule_revisions WHERE definition ? 'window') windows
       CROSS JOIN LATERAL (SELECT CASE w ->> 'kind' WHEN 'hours' THEN 24 ELSE 1 END AS unit) of_kind
     ) spans`,
    [now],
  );
  return span?.latest ? span : { earliest: null, latest: '9999-12-31' };
}
