import { mayEverywhere } from '@shared/access/ability';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { listProcedures } from '@shared/procedures/procedures-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

export interface ProcedureRecord {
  readonly id: string;
  readonly code: string;
  readonly retiredAt: Date | null;
  readonly version: number;
}

export interface VersionRecord {
  readonly id: string;
  readonly number: number;
  readonly content: ProcedureContent;
  readonly publishedAt: Date | null;
  readonly publishedBy: string | null;
  readonly version: number;
}

/** @throws Problem 404 when the organisation has no such procedure. */
export async function findProcedure(
  tenant: Tenant,
  id: string,
  { lock = false } = {},
): Promise<ProcedureRecord> {
  const found = await tenant.row<ProcedureRecord>(
    `SELECT id, code, retired_at AS "retiredAt", version FROM procedures WHERE id = $1
     ${lock ? 'FOR UPDATE' : ''}`,
    [id],
  );
  if (!found) throw notFound('procedure');
  return found;
}

/** All versions, newest first. */
export function versionsOf(tenant: Tenant, procedureId: string): Promise<VersionRecord[]> {
  return tenant.rows<VersionRecord>(
    `SELECT v.id, v.number, v.content, v.published_at AS "publishedAt", p.name AS "publishedBy",
       v.version
     FROM procedure_versions v LEFT JOIN people p ON p.id = v.published_by
     WHERE v.procedure_id = $1 ORDER BY v.number DESC`,
    [procedureId],
  );
}

/** Rules in force that use a procedure. */
export function rulesUsing(tenant: Tenant, procedureId: string) {
  return tenant.rows<{ id: string; name: string; programmeId: string; programmeName: string }>(
    `SELECT r.id, r.name, g.id AS "programmeId", g.name AS "programmeName"
     FROM rules r JOIN programmes g ON g.id = r.programme_id
     WHERE r.procedure_id = $1 AND r.retired_at IS NULL AND g.retired_at IS NULL
     ORDER BY g.name, r.name`,
    [procedureId],
  );
}

/** The version in force of each procedure: what a task begun now is done by. */
export function versionsInForce(tenant: Tenant, procedureIds: readonly string[]) {
  return tenant.rows<{
    procedureId: string;
    versionId: string;
    number: number;
    content: ProcedureContent;
  }>(
    `SELECT DISTINCT ON (procedure_id) procedure_id AS "procedureId", id AS "versionId", number,
       content
     FROM procedure_versions
     WHERE procedure_id = ANY($1::uuid[]) AND published_at IS NOT NULL
     ORDER BY procedure_id, number DESC`,
    [procedureIds],
  );
}

const sortColumns = {
  title: 'lower(title)',
  minutes: 'minutes',
  published: '"publishedAt"',
} as const;

interface ListRow {
  readonly id: string;
  readonly code: string;
  readonly titles: { readonly en: string; readonly es: string };
  readonly minutes: number;
  readonly steps: number;
  readonly published: number | null;
  readonly publishedAt: Date | null;
  readonly hasDraft: boolean;
  readonly rules: number;
  readonly retiredAt: Date | null;
  readonly total: number;
}

/**
 * A page of procedures, each as its version in force shows it, or its draft before that. Those that
 * were never published are shown only to who may edit.
 */
export async function pageOfProcedures(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof listProcedures>,
): Promise<ReplyOf<typeof listProcedures>> {
  const binds = new Binds();
  const where = [
    {
      live: '"retiredAt" IS NULL',
      published: '"retiredAt" IS NULL AND published IS NOT NULL',
      retired: '"retiredAt" IS NOT NULL',
      all: 'true',
    }[query.state],
  ];
  if (!mayEverywhere('procedures.edit', actor.grants)) where.push('published IS NOT NULL');
  if (query.q) {
    const like = binds.add(`%${query.q.replace(/[\\%_]/g, '\\$&')}%`);
    where.push(
      `(titles ->> 'en' ILIKE ${like} OR titles ->> 'es' ILIKE ${like} OR code ILIKE ${like})`,
    );
  }
  const descending = query.sort.startsWith('-');
  const column = sortColumns[query.sort.replace('-', '') as keyof typeof sortColumns];
  const locale = binds.add(query.locale);
  const rows = await tenant.rows<ListRow>(
    `WITH shown AS (
       SELECT p.id, p.code, p.retired_at AS "retiredAt", v.content -> 'title' AS titles,
         v.content -> 'title' ->> ${locale}::text AS title,
         (v.content ->> 'minutes')::int AS minutes,
         jsonb_array_length(v.content -> 'steps') AS steps,
         CASE WHEN v.published_at IS NOT NULL THEN v.number END AS published,
         v.published_at AS "publishedAt",
         EXISTS (SELECT FROM procedure_versions d
           WHERE d.procedure_id = p.id AND d.published_at IS NULL) AS "hasDraft",
         (SELECT count(*)::int FROM rules r JOIN programmes g ON g.id = r.programme_id
           WHERE r.procedure_id = p.id AND r.retired_at IS NULL AND g.retired_at IS NULL) AS rules
       FROM procedures p
       JOIN LATERAL (SELECT * FROM procedure_versions v WHERE v.procedure_id = p.id
         ORDER BY v.published_at IS NULL, v.number DESC LIMIT 1) v ON true)
     SELECT *, count(*) OVER ()::int AS total FROM shown WHERE ${where.join(' AND ')}
     ORDER BY ${column} ${descending ? 'DESC NULLS LAST' : 'ASC NULLS FIRST'}, id
     LIMIT ${binds.add(query.pageSize)} OFFSET ${binds.add((query.page - 1) * query.pageSize)}`,
    binds.values,
  );
  return {
    rows: rows.map((row) => ({
      id: row.id,
      code: row.code,
      title: row.titles,
      minutes: row.minutes,
      steps: row.steps,
      published: row.published,
      publishedAt: row.publishedAt?.toISOString() ?? null,
      hasDraft: row.hasDraft,
      rules: row.rules,
      retiredAt: row.retiredAt?.toISOString() ?? null,
    })),
    total: rows[0]?.total ?? 0,
    page: query.page,
    pageSize: query.pageSize,
  };
}
