import { STRIP_WEEKS } from '@shared/tasks/tasks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { BoardQuery } from './board-query';

interface Strip {
  rate: number | null;
  weeks: (number | null)[];
}

/** SQL true for the counts `c` of closed windows of the board's rules. Counts know no technician. */
export function closedWindows({ rule, audience }: BoardQuery, binds: Binds): string {
  const all = ['true'];
  if (rule) all.push(`c.rule_id = ${binds.add(rule)}`);
  if (audience) {
    const rules = `SELECT id FROM rules WHERE audience = ${binds.add(audience)}`;
    all.push(`c.rule_id = ANY(ARRAY(${rules}))`);
  }
  return all.join(' AND ');
}

/**
 * The on-time rate of each store week by week and over all weeks.
 * @param first the Monday of the oldest week
 */
export async function stripsOf(
  tenant: Tenant,
  query: BoardQuery,
  storeIds: readonly string[],
  first: string,
): Promise<Map<string, Strip>> {
  const binds = new Binds();
  const from = `${binds.add(first)}::date`;
  const rows = await tenant.rows<{
    storeId: string;
    week: number;
    onTime: number;
    counted: number;
  }>(
    `SELECT c.store_id AS "storeId", (c.week - ${from}) / 7 AS week, sum(c.on_time)::int AS "onTime",
       sum(c.on_time + c.late + c.not_done)::int AS counted
     FROM compliance_weeks c
     WHERE c.store_id = ANY(${binds.add(storeIds)}::uuid[]) AND c.week >= ${from}
       AND c.week < ${from} + ${STRIP_WEEKS * 7} AND ${closedWindows(query, binds)}
     GROUP BY 1, 2`,
    binds.values,
  );
  const strips = new Map<string, Strip & { onTime: number; counted: number }>();
  for (const { storeId, week, onTime, counted } of rows) {
    const strip = strips.get(storeId) ?? {
      rate: null,
      weeks: Array<number | null>(STRIP_WEEKS).fill(null),
      onTime: 0,
      counted: 0,
    };
    strips.set(storeId, strip);
    strip.weeks[week] = share(onTime, counted);
    strip.onTime += onTime;
    strip.counted += counted;
  }
  return new Map(
    [...strips].map(([id, { weeks, onTime, counted }]) => [
      id,
      { rate: share(onTime, counted), weeks },
    ]),
  );
}

/** Nothing, not zero, where nothing counted. */
export const share = (onTime: number, counted: number) => (counted === 0 ? null : onTime / counted);
