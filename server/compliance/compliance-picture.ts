import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { readCompliancePicture } from '@shared/compliance/compliance-contract';
import { monthRange } from '@shared/compliance/month';
import { onTimeRate, type WindowCounts } from '@shared/compliance/on-time-rate';
import { addCounts, noWindows } from '@shared/compliance/window-end';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { complianceFilter, complianceFrom, daysOf, sums } from './compliance-range';

type Reply = ReplyOf<typeof readCompliancePicture>;

interface Cell {
  readonly storeId: string;
  readonly number: string;
  readonly name: string;
  /** `YYYY-MM`. */
  readonly month: string;
  readonly counts: WindowCounts;
}

/** On-time rates of stores by month: a page of stores by number, one cell for each month. */
export async function compliancePicture(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof readCompliancePicture>,
): Promise<Reply> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const days = daysOf(query.from, query.to);
  const where = `${complianceFilter(actor, query, binds)}
    AND d.month BETWEEN ${binds.add(days.from)} AND ${binds.add(days.to)}`;
  const stores = await tenant.row<{ total: number }>(
    `SELECT count(DISTINCT d.store_id)::int AS total ${complianceFrom} WHERE ${where}`,
    binds.values,
  );
  const cells = await tenant.rows<Cell>(
    `WITH shown AS (
       SELECT s.id ${complianceFrom} WHERE ${where} GROUP BY s.id, s.number, s.name
       ORDER BY s.number, s.name, s.id
       LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)})
     SELECT s.id AS "storeId", s.number, s.name, to_char(d.month, 'YYYY-MM') AS month,
       ${sums('true')} AS counts
     ${complianceFrom} JOIN shown ON shown.id = s.id WHERE ${where}
     GROUP BY s.id, s.number, s.name, to_char(d.month, 'YYYY-MM')
     ORDER BY s.number, s.name, s.id`,
    binds.values,
  );
  const months = monthRange(query.from, query.to);
  return { months, rows: byStore(cells, months), total: stores?.total ?? 0, page, pageSize };
}

function byStore(cells: readonly Cell[], months: readonly string[]): Reply['rows'] {
  const stores = new Map<string, { cell: Cell; counts: Map<string, WindowCounts> }>();
  for (const cell of cells) {
    const store = stores.get(cell.storeId) ?? { cell, counts: new Map() };
    store.counts.set(cell.month, cell.counts);
    stores.set(cell.storeId, store);
  }
  return [...stores.values()].map(({ cell: { storeId, number, name }, counts }) => {
    const each = months.map((month) => counts.get(month) ?? noWindows);
    return {
      storeId,
      number,
      name,
      rate: onTimeRate(each.reduce(addCounts, noWindows)),
      cells: each.map((it) => ({ counts: it, rate: onTimeRate(it) })),
    };
  });
}
