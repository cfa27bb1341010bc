import type { Tenant } from '@db/tenant-transaction';

/** As recordEvent, for one act on many things of a kind, in one statement. */
export async function recordEvents(
  tenant: Tenant,
  act: {
    readonly actorId: string;
    readonly subjectKind: string;
    readonly action: string;
    readonly subjects: readonly { readonly id: string; readonly detail: object }[];
  },
): Promise<void> {
  if (act.subjects.length === 0) return;
  await tenant.rows(
    `INSERT INTO audit_events (organisation_id, actor_id, subject_kind, subject_id, action, detail)
     SELECT $1, $2, $3, id, $4, detail
     FROM jsonb_to_recordset($5::jsonb) AS it (id uuid, detail jsonb)`,
    [tenant.organisationId, act.actorId, act.subjectKind, act.action, JSON.stringify(act.subjects)],
  );
}
