import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { listFindings, readFinding } from '@shared/findings/findings-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

export type Finding = ReplyOf<typeof readFinding>;
export type FindingQuery = QueryOf<typeof listFindings>;

interface FindingRow extends Omit<Finding, 'foundAt' | 'settledAt'> {
  foundAt: Date;
  settledAt: Date | null;
}

const columns = `
  f.id, f.version, f.store_id AS "storeId", s.number AS "storeNumber", s.name AS "storeName",
  s.time_zone AS "timeZone", f.unit_id AS "unitId", u.tag AS "unitTag",
  f.component_kind AS "componentKind", f.cause, f.severity, f.note, to_jsonb(f.photo_ids) AS "photoIds",
  f.found_at AS "foundAt", p.name AS "foundBy", i.task_id AS "taskId", f.settled_at AS "settledAt",
  q.name AS "settledBy", f.settled_note AS "settledNote"`;

const joinedFrom = (findings: string) => `
  FROM ${findings} f
  JOIN stores s ON s.id = f.store_id
  JOIN people p ON p.id = f.found_by
  LEFT JOIN people q ON q.id = f.settled_by
  LEFT JOIN units u ON u.id = f.unit_id
  LEFT JOIN inspections i ON i.id = f.inspection_id`;

const severityOrder = `array_position(ARRAY['watch', 'plan', 'stop'], f.severity)`;

const sorts: Readonly<Record<FindingQuery['sort'], string>> = {
  foundAt: 'f.found_at, f.id',
  '-foundAt': 'f.found_at DESC, f.id',
  severity: `${severityOrder}, f.found_at DESC, f.id`,
  '-severity': `${severityOrder} DESC, f.found_at DESC, f.id`,
  store: 's.number, f.found_at DESC, f.id',
  '-store': 's.number DESC, f.found_at DESC, f.id',
};

/** Findings in the actor's stores; the page asked for, and how many there are in all. */
export async function listFindingRows(
  tenant: Tenant,
  actor: Actor,
  query: FindingQuery,
): Promise<ReplyOf<typeof listFindings>> {
  const binds = new Binds();
  const where = conditions(actor, query, binds);
  const [count] = await tenant.rows<{ total: number }>(
    `SELECT count(*)::int AS total FROM findings f JOIN stores s ON s.id = f.store_id
       LEFT JOIN units u ON u.id = f.unit_id WHERE ${where}`,
    binds.values,
  );
  const { page, pageSize } = query;
  const rows = await tenant.rows<FindingRow>(
    // The page is cut out first; only its rows are joined with all that is shown of them.
    `WITH page AS MATERIALIZED (
       SELECT f.* FROM findings f JOIN stores s ON s.id = f.store_id
         LEFT JOIN units u ON u.id = f.unit_id
       WHERE ${where} ORDER BY ${sorts[query.sort]}
       LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)})
     SELECT ${columns} ${joinedFrom('page')} ORDER BY ${sorts[query.sort]}`,
    binds.values,
  );
  return { rows: rows.map(present), total: count?.total ?? 0, page, pageSize };
}

/** One finding. @throws Problem 404 when it does not exist or lies out of the actor's sight */
export async function findingById(tenant: Tenant, actor: Actor, id: string): Promise<Finding> {
  const binds = new Binds();
  const row = await tenant.row<FindingRow>(
    `SELECT ${columns} ${joinedFrom('findings')}
     WHERE ${visibleStores(actor, 'findings.read', binds)} AND f.id = ${binds.add(id)}`,
    binds.values,
  );
  if (!row) throw notFound('finding');
  return present(row);
}

function conditions(actor: Actor, query: FindingQuery, binds: Binds): string {
  const all = [visibleStores(actor, 'findings.read', binds)];
  const equal = (column: string, value: string | undefined) => {
    if (value !== undefined) all.push(`${column} = ${binds.add(value)}`);
  };
  equal('f.store_id', query.store);
  equal('s.region_id', query.region);
  equal('s.chain_id', query.chain);
  equal('f.unit_id', query.unit);
  equal('f.cause', query.cause);
  equal('f.severity', query.severity);
  if (query.settled) all.push(`f.settled_at IS ${query.settled === 'yes' ? 'NOT ' : ''}NULL`);
  const localDay = '(f.found_at AT TIME ZONE s.time_zone)::date';
  if (query.from) all.push(`${localDay} >= ${binds.add(query.from)}`);
  if (query.to) all.push(`${localDay} <= ${binds.add(query.to)}`);
  if (query.q) {
    const like = binds.add(`%${query.q.replace(/[\\%_]/g, '\\$&')}%`);
    all.push(
      `(f.note ILIKE ${like} OR s.number || ' ' || s.name ILIKE ${like} OR u.tag ILIKE ${like})`,
    );
  }
  return all.join(' AND ');
}

function present(row: FindingRow): Finding {
  return {
    ...row,
    foundAt: row.foundAt.toISOString(),
    settledAt: row.settledAt?.toISOString() ?? null,
  };
}
