import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { listProgrammes, listRules } from '@shared/programmes/programmes-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';

export interface ProgrammeRecord {
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly retiredAt: Date | null;
  readonly version: number;
}

/** @throws Problem 404 when the organisation has no such programme. */
export async function findProgramme(
  tenant: Tenant,
  id: string,
  { lock = false } = {},
): Promise<ProgrammeRecord> {
  const found = await tenant.row<ProgrammeRecord>(
    `SELECT id, name, description, retired_at AS "retiredAt", version FROM programmes
     WHERE id = $1 ${lock ? 'FOR UPDATE' : ''}`,
    [id],
  );
  if (!found) throw notFound('programme');
  return found;
}

const sortColumns = {
  name: 'lower(p.name)',
  rules: 'rules',
  stores: 'stores',
  units: 'units',
} as const;

interface ListRow extends ProgrammeRecord {
  readonly rules: number;
  readonly enrolments: number;
  readonly stores: number;
  readonly units: number;
  readonly total: number;
}

/** A page of programmes with how far each reaches now. */
export async function pageOfProgrammes(
  tenant: Tenant,
  query: QueryOf<typeof listProgrammes>,
): Promise<ReplyOf<typeof listProgrammes>> {
  const binds = new Binds();
  const where: string[] = [
    { live: 'p.retired_at IS NULL', retired: 'p.retired_at IS NOT NULL', all: 'true' }[query.state],
  ];
  if (query.q) where.push(`(p.name ILIKE ${binds.add(contains(query.q))})`);
  const column = sortColumns[query.sort.replace('-', '') as keyof typeof sortColumns];
  const direction = query.sort.startsWith('-') ? 'DESC' : 'ASC';
  const rows = await tenant.rows<ListRow>(
    `SELECT p.id, p.name, p.description, p.retired_at AS "retiredAt",
       (SELECT count(*)::int FROM rules r WHERE r.programme_id = p.id AND r.retired_at IS NULL)
         AS rules,
       (SELECT count(*)::int FROM enrolments e WHERE e.programme_id = p.id AND NOT e.exception)
         AS enrolments,
       coalesce(reach.stores, 0) AS stores, coalesce(reach.units, 0) AS units,
       count(*) OVER ()::int AS total
     FROM programmes p LEFT JOIN (${reachOfProgrammes}) reach ON reach.programme_id = p.id
     WHERE ${where.join(' AND ')} ORDER BY ${column} ${direction}, p.id
     LIMIT ${binds.add(query.pageSize)} OFFSET ${binds.add((query.page - 1) * query.pageSize)}`,
    binds.values,
  );
  return {
    rows: rows.map(({ id, name, description, retiredAt, rules, enrolments, stores, units }) => ({
      id,
      name,
      description,
      retiredAt: retiredAt?.toISOString() ?? null,
      rules,
      enrolments,
      reach: { stores, units },
    })),
    total: rows[0]?.total ?? 0,
    page: query.page,
    pageSize: query.pageSize,
  };
}

/** Stores and units that have tasks of each programme to come. */
export const reachOfProgrammes = `
  SELECT r.programme_id, count(DISTINCT sc.store_id)::int AS stores,
    count(DISTINCT sc.unit_id)::int AS units
  FROM schedules sc JOIN rules r ON r.id = sc.rule_id
  WHERE sc.ended_at IS NULL GROUP BY r.programme_id`;

/** Rules by programme and name, for choosing one; at most 200. */
export async function rulesToChoose(
  tenant: Tenant,
  { q, state }: QueryOf<typeof listRules>,
): Promise<ReplyOf<typeof listRules>> {
  const rows = await tenant.rows<ReplyOf<typeof listRules>['rows'][number]>(
    `SELECT r.id, r.name, r.audience, p.id AS "programmeId", p.name AS "programmeName"
     FROM rules r JOIN programmes p ON p.id = r.programme_id
     WHERE (r.name ILIKE $1 OR p.name ILIKE $1)
       AND ($2 = 'all' OR (r.retired_at IS NULL AND p.retired_at IS NULL))
     ORDER BY lower(p.name), lower(r.name) LIMIT 200`,
    [contains(q), state],
  );
  return { rows };
}

/** A pattern for ILIKE that finds the text anywhere, its wildcards meaning themselves. */
export function contains(text: string): string {
  return `%${text.replace(/[\\%_]/g, '\\$&')}%`;
}
