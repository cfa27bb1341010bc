import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { listUnplanned } from '@shared/visits/visits-contract';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { naturalOrder, searchText } from '../fleet/search-text';
import { asPlannedTask, plannedTaskRows, stateAt, sumMinutes } from './planned-tasks';
import { type Stop, stopColumn } from './stop-columns';
import { freeToPlan } from './visit-tasks';

type Query = QueryOf<typeof listUnplanned>;

interface StoreRow {
  store: Stop;
  chainName: string;
  regionName: string;
  closesOn: string;
  overdue: number;
}

const sorts: Readonly<Record<Query['sort'], string>> = {
  closesOn: `min(t.closes_on), ${naturalOrder('s.number')}, s.id`,
  '-tasks': `count(*) DESC, min(t.closes_on), s.id`,
  store: `${naturalOrder('s.number')}, s.id`,
};

/** Stores with technicians’ tasks that can be done and wait for no visit. */
export async function unplannedStores(
  tenant: Tenant,
  actor: Actor,
  query: Query,
  now: Date,
): Promise<ReplyOf<typeof listUnplanned>> {
  const binds = new Binds();
  const at = binds.add(now);
  const where = conditions(actor, query, binds, at);
  const from = `FROM tasks t JOIN stores s ON s.id = t.store_id
    JOIN chains c ON c.id = s.chain_id JOIN regions g ON g.id = s.region_id WHERE ${where}`;
  const [count] = await tenant.rows<{ total: number }>(
    `SELECT count(DISTINCT s.id)::int AS total ${from}`,
    binds.values,
  );
  const { page, pageSize } = query;
  const rows = await tenant.rows<StoreRow>(
    `SELECT ${stopColumn}, c.name AS "chainName", g.name AS "regionName",
       min(t.closes_on) AS "closesOn",
       (count(*) FILTER (WHERE ${stateAt(at)} = 'overdue'))::int AS overdue
     ${from} GROUP BY s.id, c.id, g.id ORDER BY ${sorts[query.sort]}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  const tasks = await tasksOf(tenant, query, rows, now);
  return {
    rows: rows.map((row) => {
      const its = tasks.filter(({ storeId }) => storeId === row.store.id).map(asPlannedTask);
      return { ...row, minutes: sumMinutes(its), tasks: its };
    }),
    total: count?.total ?? 0,
    page,
    pageSize,
  };
}

function tasksOf(tenant: Tenant, query: Query, rows: readonly StoreRow[], now: Date) {
  if (rows.length === 0) return [];
  const binds = new Binds();
  const stores = binds.add(rows.map(({ store }) => store.id));
  const open = openTasks(query.by, binds, binds.add(now));
  return plannedTaskRows(tenant, binds, `t.store_id = ANY(${stores}::uuid[]) AND ${open}`, now);
}

function openTasks(by: string, binds: Binds, now: string): string {
  return `t.audience = 'technician' AND t.outcome = 'none' AND t.lapses_at > ${now}::timestamptz
    AND (t.opens_at AT TIME ZONE t.time_zone)::date <= ${binds.add(by)}::date
    AND ${freeToPlan(now)}`;
}

function conditions(actor: Actor, query: Query, binds: Binds, now: string): string {
  const all = [
    visibleStores(actor, 'visits.plan', binds),
    's.retired_at IS NULL',
    openTasks(query.by, binds, now),
    searchText(query.q, ['s.number', 's.name', 's.city', 's.postal_code', 'c.name'], binds),
  ];
  if (query.region) all.push(`s.region_id = ${binds.add(query.region)}`);
  if (query.chain) all.push(`s.chain_id = ${binds.add(query.chain)}`);
  return all.join(' AND ');
}
