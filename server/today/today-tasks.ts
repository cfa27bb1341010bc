import type { LocalizedText } from '@shared/procedures/procedure-content';
import type { StoreHours } from '@shared/fleet/store-hours';
import type { TaskState } from '@shared/tasks/task-state';
import type { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';

/** A task of the day with the store it is in and what its procedure asks for. */
export interface TodayTaskRow {
  id: string;
  visitId: string | null;
  unitTag: string | null;
  title: LocalizedText;
  state: TaskState;
  dueOn: string;
  opensAt: Date;
  closesAt: Date;
  minutes: number;
  cautions: number;
  couldNot: string | null;
  tools: LocalizedText[];
  parts: LocalizedText[];
  storeId: string;
}

export interface TodayStoreRow {
  id: string;
  number: string;
  name: string;
  address: string;
  phone: string;
  accessNote: string;
  timeZone: string;
  hours: Partial<StoreHours>;
}

/**
 * Tasks that fit a condition on `tasks t` and `stores s`, the most urgent first, each with the
 * procedure in force. Tasks of a procedure that was never published cannot be done and are left out.
 */
export function todayTaskRows(
  tenant: Tenant,
  now: Date,
  limit: number,
  binds: Binds,
  where: string,
): Promise<TodayTaskRow[]> {
  return tenant.rows<TodayTaskRow>(
    `SELECT t.id, t.visit_id AS "visitId", u.tag AS "unitTag", v.content -> 'title' AS title,
       task_state(t.outcome, t.outcome_at, t.opens_at, t.due_soon_at, t.closes_at, t.lapses_at,
         ${binds.add(now)}::timestamptz) AS state,
       t.due_on AS "dueOn", t.opens_at AS "opensAt", t.closes_at AS "closesAt",
       (v.content ->> 'minutes')::int AS minutes,
       (jsonb_array_length(v.content -> 'cautions')
         + jsonb_array_length(jsonb_path_query_array(v.content, '$.steps[*].caution')))::int
         AS cautions,
       CASE WHEN t.outcome = 'none' THEN t.outcome_reason END AS "couldNot",
       v.content -> 'tools' AS tools, v.content -> 'parts' AS parts, t.store_id AS "storeId"
     FROM tasks t
     JOIN stores s ON s.id = t.store_id
     LEFT JOIN units u ON u.id = t.unit_id
     JOIN LATERAL (
       SELECT content FROM procedure_versions
       WHERE procedure_id = t.procedure_id AND published_at IS NOT NULL
       ORDER BY number DESC LIMIT 1
     ) v ON true
     WHERE ${where}
     ORDER BY t.closes_at, t.id LIMIT ${binds.add(limit)}`,
    binds.values,
  );
}

/** What a technician needs to know of the stores, by id. */
export async function todayStores(
  tenant: Tenant,
  ids: readonly string[],
): Promise<Map<string, TodayStoreRow>> {
  if (ids.length === 0) return new Map();
  const rows = await tenant.rows<TodayStoreRow>(
    `SELECT id, number, name, phone, access_note AS "accessNote", time_zone AS "timeZone", hours,
       concat_ws(', ', nullif(address_line, ''), nullif(city, ''),
         nullif(concat_ws(' ', nullif(state, ''), nullif(postal_code, '')), '')) AS address
     FROM stores WHERE id = ANY($1::uuid[])`,
    [[...new Set(ids)]],
  );
  return new Map(rows.map((row) => [row.id, row]));
}
