import type { Tenant } from '@db/tenant-transaction';

const BATCH = 5_000;

/** Inserts rows of one shape, columns named by their keys, a few thousand at a time. */
export async function insertRows(
  tenant: Tenant,
  table: string,
  rows: readonly Readonly<Record<string, unknown>>[],
): Promise<void> {
  const [first] = rows;
  if (!first) return;
  const columns = ['organisation_id', ...Object.keys(first)].join(', ');
  for (let from = 0; from < rows.length; from += BATCH) {
    const batch = rows
      .slice(from, from + BATCH)
      .map((row) => ({ organisation_id: tenant.organisationId, ...row }));
    await tenant.rows(
      `INSERT INTO ${table} (${columns})
       SELECT ${columns} FROM jsonb_populate_recordset(NULL::${table}, $1::jsonb)`,
      [JSON.stringify(batch)],
    );
  }
}
