import type { Tenant } from '@db/tenant-transaction';
import type { ChangeableFields, ChangeableTask } from './select-tasks';

/** The fields of a task as it stands, to be kept until the change may be taken back. */
export const fieldsOf = (task: ChangeableTask): ChangeableFields => ({
  outcome: task.outcome,
  outcomeAt: task.outcomeAt,
  outcomeBy: task.outcomeBy,
  outcomeReason: task.outcomeReason,
  assignedTo: task.assignedTo,
  visitId: task.visitId,
  dueOn: task.dueOn,
  closesOn: task.closesOn,
  dueSoonAt: task.dueSoonAt,
  dueAt: task.dueAt,
  closesAt: task.closesAt,
  lapsesAt: task.lapsesAt,
  deferredFrom: task.deferredFrom,
});

/**
 * Writes new fields of locked tasks, each a version on, in one statement, and has the days counted
 * again whose closed windows come out differently.
 */
export async function writeTasks(
  tenant: Tenant,
  changes: readonly { readonly task: ChangeableTask; readonly after: ChangeableFields }[],
  now: Date,
): Promise<void> {
  if (changes.length === 0) return;
  await tenant.rows(
    `UPDATE tasks t SET outcome = n.outcome, outcome_at = n."outcomeAt",
       outcome_by = n."outcomeBy", outcome_reason = n."outcomeReason",
       assigned_to = n."assignedTo", visit_id = (SELECT v.id FROM visits v WHERE v.id = n."visitId"),
       due_on = n."dueOn", closes_on = n."closesOn", due_soon_at = n."dueSoonAt", due_at = n."dueAt",
       closes_at = n."closesAt", lapses_at = n."lapsesAt", deferred_from = n."deferredFrom",
       version = t.version + 1
     FROM jsonb_to_recordset($1::jsonb) AS n (id uuid, "occursLocal" timestamp, outcome text,
       "outcomeAt" timestamptz, "outcomeBy" uuid, "outcomeReason" text, "assignedTo" uuid,
       "visitId" uuid, "dueOn" date, "closesOn" date, "dueSoonAt" timestamptz, "dueAt" timestamptz,
       "closesAt" timestamptz, "lapsesAt" timestamptz, "deferredFrom" date)
     WHERE t.id = n.id AND t.occurs_local = n."occursLocal"`,
    [
      JSON.stringify(
        changes.map(({ task: { id, occursLocal }, after }) => ({ ...after, id, occursLocal })),
      ),
    ],
  );
  await markDaysStale(tenant, changes, now);
}

async function markDaysStale(
  tenant: Tenant,
  changes: readonly { readonly task: ChangeableTask; readonly after: ChangeableFields }[],
  now: Date,
): Promise<void> {
  const days = new Map<string, { store: string; day: string }>();
  for (const { task, after } of changes) {
    for (const { closesAt, closesOn } of [task, after]) {
      if (now < closesAt) continue;
      days.set(`${task.storeId} ${closesOn}`, { store: task.storeId, day: closesOn });
    }
  }
  if (days.size === 0) return;
  // In one order for everybody, as marks already there are held until commit.
  const sorted = [...days].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, day]) => day);
  await tenant.rows(
    `INSERT INTO stale_days (organisation_id, store_id, day)
     SELECT $1, store_id, day
     FROM unnest($2::uuid[], $3::date[]) WITH ORDINALITY AS d (store_id, day, place) ORDER BY place
     ON CONFLICT DO NOTHING`,
    [tenant.organisationId, sorted.map(({ store }) => store), sorted.map(({ day }) => day)],
  );
}
