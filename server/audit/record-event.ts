import type { Tenant } from '@db/tenant-transaction';

/** Writes down who did what to which thing, in the transaction that does it. */
export async function recordEvent(
  tenant: Tenant,
  event: {
    readonly actorId: string | null;
    readonly subjectKind: string;
    readonly subjectId: string;
    readonly action: string;
    readonly detail?: object;
  },
): Promise<void> {
  await tenant.rows(
    `INSERT INTO audit_events (organisation_id, actor_id, subject_kind, subject_id, action, detail)
     VALUES ($1, $2, $3, $4, $5, $6)`,
    [
      tenant.organisationId,
      event.actorId,
      event.subjectKind,
      event.subjectId,
      event.action,
      JSON.stringify(event.detail ?? {}),
    ],
  );
}
