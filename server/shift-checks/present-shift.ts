import type { ReplyOf } from '@shared/contract/endpoint';
import type { readShift } from '@shared/shift-checks/shift-checks-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { presentTaskSheets } from '../inspections/present-task-sheet';
import { comingVisits } from './coming-visits';
import { taskRows } from '../inspections/task-rows';

interface StoreRow {
  id: string;
  number: string;
  name: string;
  timeZone: string;
}

/** More than a shift ever holds; a store in deep arrears sees the most urgent ones first. */
const MOST = 30;

/** The store's checks that wait now, and those done since its own midnight. */
export async function presentShift(
  tenant: Tenant,
  actor: Actor,
  wanted: string | undefined,
  now: Date,
): Promise<ReplyOf<typeof readShift>> {
  const binds = new Binds();
  const rows = await tenant.rows<StoreRow>(
    `SELECT s.id, s.number, s.name, s.time_zone AS "timeZone" FROM stores s
     WHERE ${visibleStores(actor, 'shift.read', binds)} AND s.retired_at IS NULL
     ORDER BY s.number LIMIT 200`,
    binds.values,
  );
  const stores = rows.map(({ id, number, name }) => ({ id, number, name }));
  const store = rows.find(({ id }) => id === wanted) ?? rows[0];
  if (!store) return { stores, storeId: null, timeZone: null, waiting: [], done: [], visits: [] };
  const waiting = await taskRows(
    tenant,
    actor,
    'shift.read',
    (it) => `t.store_id = ${it.add(store.id)} AND t.audience = 'store' AND t.outcome = 'none'
      AND t.opens_at <= ${it.add(now)} AND t.lapses_at > ${it.add(now)}`,
  );
  const done = await tenant.rows<{
    taskId: string;
    ruleName: string;
    by: string;
    at: Date;
    onTime: boolean;
  }>(
    `SELECT t.id AS "taskId", r.name AS "ruleName", p.name AS by, t.outcome_at AS at,
       t.outcome_at < t.closes_at AS "onTime"
     FROM tasks t JOIN rules r ON r.id = t.rule_id JOIN people p ON p.id = t.outcome_by
     WHERE t.store_id = $1 AND t.audience = 'store' AND t.outcome = 'done'
       AND t.outcome_at >= date_trunc('day', $2::timestamptz AT TIME ZONE $3) AT TIME ZONE $3
     ORDER BY t.outcome_at DESC`,
    [store.id, now, store.timeZone],
  );
  return {
    stores,
    storeId: store.id,
    timeZone: store.timeZone,
    waiting: await presentTaskSheets(tenant, actor, waiting.slice(0, MOST), now),
    visits: await comingVisits(tenant, store, now),
    done: done.map((it) => ({ ...it, at: it.at.toISOString() })),
  };
}
