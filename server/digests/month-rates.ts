import { complianceFigures } from '@shared/compliance/compliance-figures';
import { addToMonth, lastDayOf, type Month, monthRange } from '@shared/compliance/month';
import { onTimeRate, type WindowCounts } from '@shared/compliance/on-time-rate';
import { addCounts, noWindows } from '@shared/compliance/window-end';
import type { DigestContent } from '@shared/digests/digest-content';
import type { Tenant } from '@db/tenant-transaction';
import { sums } from '../compliance/compliance-range';

type Rates = Pick<
  DigestContent,
  'counts' | 'rate' | 'previousRate' | 'change' | 'months' | 'stores'
>;

/** So many months are set side by side: half a year, enough to see where it is going. */
const MONTHS_SHOWN = 6;

interface StoreMonths {
  readonly storeId: string;
  readonly number: string;
  readonly name: string;
  /** By `YYYY-MM`. */
  readonly months: Readonly<Record<string, WindowCounts>>;
}

/** The chain's on-time rate in the month and the months before it, and that of each of its stores. */
export async function monthRates(tenant: Tenant, chainId: string, month: Month): Promise<Rates> {
  const shown = monthRange(addToMonth(month, 1 - MONTHS_SHOWN), month);
  const stores = await tenant.rows<StoreMonths>(
    `SELECT s.id AS "storeId", s.number, s.name,
       coalesce(jsonb_object_agg(d.month, d.counts) FILTER (WHERE d.month IS NOT NULL), '{}') AS months
     FROM stores s
     LEFT JOIN LATERAL (
       SELECT to_char(d.day, 'YYYY-MM') AS month, ${sums('true')} AS counts
       FROM compliance_days d WHERE d.store_id = s.id AND d.day BETWEEN $2 AND $3
       GROUP BY to_char(d.day, 'YYYY-MM')) d ON true
     WHERE s.chain_id = $1
       AND (s.retired_at IS NULL OR d.month IS NOT NULL)
     GROUP BY s.id, s.number, s.name
     ORDER BY s.number, s.name, s.id`,
    [chainId, `${shown[0]}-01`, lastDayOf(month)],
  );
  const countsOf = (of: Month) =>
    stores.map(({ months }) => months[of] ?? noWindows).reduce(addCounts, noWindows);
  const { counts, rate, previousRate, change } = complianceFigures(
    countsOf(month),
    countsOf(addToMonth(month, -1)),
  );
  return {
    counts,
    rate,
    previousRate,
    change,
    months: shown.map((each) => ({
      month: each,
      counts: countsOf(each),
      rate: onTimeRate(countsOf(each)),
    })),
    stores: lowestFirst(stores, month),
  };
}

function lowestFirst(stores: readonly StoreMonths[], month: Month): DigestContent['stores'] {
  return stores
    .map(({ storeId, number, name, months }) => {
      const now = months[month] ?? noWindows;
      const before = months[addToMonth(month, -1)] ?? noWindows;
      const { counts, rate, change } = complianceFigures(now, before);
      return { storeId, number, name, counts, rate, change };
    })
    .sort((a, b) => (a.rate ?? 2) - (b.rate ?? 2));
}
