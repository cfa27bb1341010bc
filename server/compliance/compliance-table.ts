import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { readCompliance } from '@shared/compliance/compliance-contract';
import { complianceFigures } from '@shared/compliance/compliance-figures';
import type { WindowCounts } from '@shared/compliance/on-time-rate';
import { noWindows } from '@shared/compliance/window-end';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import {
  complianceFilter,
  complianceFrom,
  daysBefore,
  daysOf,
  rateSql,
  sums,
} from './compliance-range';

export type ComplianceQuery = QueryOf<typeof readCompliance>;
type Reply = ReplyOf<typeof readCompliance>;
type Row = Reply['rows'][number];

interface Sums {
  readonly now: WindowCounts;
  readonly before: WindowCounts;
}

interface Grouping {
  readonly id: string;
  readonly name: string;
  /** What else is said of a row: columns that hang on the id. */
  readonly columns: string;
  readonly join: string;
  readonly keys: string;
}

const nothing = `NULL::text AS number, NULL::jsonb AS "window"`;

const groupings: Readonly<Record<ComplianceQuery['by'], Grouping>> = {
  store: {
    id: 's.id',
    name: 's.number, s.name',
    columns: `s.name, s.number, NULL::jsonb AS "window"`,
    join: '',
    keys: 's.id, s.name, s.number',
  },
  region: {
    id: 'g.id',
    name: 'g.name',
    columns: `g.name, ${nothing}`,
    join: 'JOIN regions g ON g.id = s.region_id',
    keys: 'g.id, g.name',
  },
  chain: {
    id: 'c.id',
    name: 'c.name',
    columns: `c.name, ${nothing}`,
    join: 'JOIN chains c ON c.id = s.chain_id',
    keys: 'c.id, c.name',
  },
  rule: {
    id: 'r.id',
    name: 'r.name',
    columns: `r.name, NULL::text AS number, r.time_window AS "window"`,
    join: '',
    keys: 'r.id, r.name, r.time_window',
  },
};

/**
 * On-time rates by store, region, chain or rule over a range of months, compared with as many months
 * just before; the rows asked for and the totals of all of them.
 */
export async function complianceTable(
  tenant: Tenant,
  actor: Actor,
  query: ComplianceQuery,
): Promise<Reply> {
  const { page, pageSize } = query;
  const binds = new Binds();
  const { where, inRange, inRangeBefore } = conditions(actor, query, binds);
  const grouping = groupings[query.by];
  const totals = await tenant.row<Sums & { groups: number }>(
    `SELECT ${sums(inRange)} AS now, ${sums(inRangeBefore)} AS before,
       count(DISTINCT ${grouping.id})::int AS groups
     ${complianceFrom} ${grouping.join} WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<Pick<Row, 'id' | 'name' | 'number' | 'window'> & Sums>(
    `SELECT ${grouping.id} AS id, ${grouping.columns}, ${sums(inRange)} AS now,
       ${sums(inRangeBefore)} AS before
     ${complianceFrom} ${grouping.join} WHERE ${where}
     GROUP BY ${grouping.keys}
     ORDER BY ${orderBy(query.sort, grouping, inRange, inRangeBefore)}
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  const counted = await tenant.row<{ on: string | null }>(
    'SELECT max(day)::text AS "on" FROM compliance_days',
  );
  return {
    rows: rows.map(({ now, before, ...row }) => ({ ...row, ...complianceFigures(now, before) })),
    total: totals?.groups ?? 0,
    page,
    pageSize,
    totals: complianceFigures(totals?.now ?? noWindows, totals?.before ?? noWindows),
    countedOn: counted?.on ?? null,
  };
}

function conditions(actor: Actor, query: ComplianceQuery, binds: Binds) {
  const filter = complianceFilter(actor, query, binds);
  const days = daysOf(query.from, query.to);
  const before = daysBefore(query.from, query.to);
  const [from, to, earliest] = [days.from, days.to, before.from].map((day) => binds.add(day));
  return {
    where: `${filter} AND d.month BETWEEN ${earliest} AND ${to}`,
    inRange: `d.month >= ${from}`,
    inRangeBefore: `d.month < ${from}`,
  };
}

/** Rows without a rate stand last in either direction: there is nothing to compare. */
function orderBy(
  sort: ComplianceQuery['sort'],
  { name, id }: Grouping,
  now: string,
  before: string,
): string {
  const down = sort.startsWith('-') ? 'DESC' : '';
  switch (sort) {
    case 'name':
    case '-name':
      return [...name.split(', '), id].map((column) => `${column} ${down}`).join(', ');
    case 'rate':
    case '-rate':
      return `${rateSql(now)} ${down} NULLS LAST, ${name}, ${id}`;
    case 'change':
    case '-change':
      return `${rateSql(now)} - ${rateSql(before)} ${down} NULLS LAST, ${name}, ${id}`;
    case 'notDone':
    case '-notDone':
      return `coalesce(sum(d.not_done) FILTER (WHERE ${now}), 0) ${down}, ${name}, ${id}`;
  }
}
