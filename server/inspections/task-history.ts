import type { ReplyOf } from '@shared/contract/endpoint';
import type { readTaskHistory } from '@shared/inspections/inspections-contract';
import type { Tenant } from '@db/tenant-transaction';

interface EventRow {
  at: Date;
  by: string | null;
  action: string;
  reason: string | null;
  note: string | null;
  findings: number | null;
}

/** Who did what to a task, newest first. Detail beyond what a reader needs stays in the audit. */
export async function taskHistory(
  tenant: Tenant,
  taskId: string,
): Promise<ReplyOf<typeof readTaskHistory>> {
  const rows = await tenant.rows<EventRow>(
    `SELECT e.at, p.name AS by, e.action, e.detail ->> 'reason' AS reason,
       e.detail ->> 'note' AS note, (e.detail ->> 'findings')::int AS findings
     FROM audit_events e LEFT JOIN people p ON p.id = e.actor_id
     WHERE e.subject_kind = 'task' AND e.subject_id = $1
     ORDER BY e.id DESC LIMIT 100`,
    [taskId],
  );
  return { events: rows.map((row) => ({ ...row, at: row.at.toISOString() })) };
}
