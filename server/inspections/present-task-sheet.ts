import type { ReplyOf } from '@shared/contract/endpoint';
import type { StepReading, readTaskSheet } from '@shared/inspections/inspections-contract';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { type Limit, type MotorNameplate, limitOf } from '@shared/procedures/within-limit';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { mayCloseTask } from './inspection-policy';
import { type TaskRow, stateOf } from './task-rows';

export type TaskSheet = ReplyOf<typeof readTaskSheet>;

interface Standing {
  id: string;
  by: string;
  finishedAt: Date;
  note: string;
  versionId: string;
  readings: { reading: StepReading; withinLimits: boolean | null }[];
}

/**
 * A task with its procedure: the version it was done under, else the newest published one.
 * @throws Problem 409 when the procedure has never been published
 */
export async function presentTaskSheet(
  tenant: Tenant,
  actor: Actor,
  row: TaskRow,
  now: Date,
): Promise<TaskSheet> {
  const standing = await standingInspection(tenant, row.id);
  const version = await tenant.row<{ id: string; content: ProcedureContent }>(
    `SELECT id, content FROM procedure_versions
     WHERE procedure_id = $1 AND published_at IS NOT NULL AND ($2::uuid IS NULL OR id = $2)
     ORDER BY number DESC LIMIT 1`,
    [row.procedureId, standing?.versionId ?? null],
  );
  if (!version) throw new Problem(409, 'not-published', 'This procedure is not published yet.');
  const state = stateOf(row, now);
  return {
    task: {
      id: row.id,
      version: row.version,
      state,
      audience: row.audience,
      ruleName: row.ruleName,
      dueOn: row.dueOn,
      timeZone: row.timeZone,
      opensAt: row.opensAt.toISOString(),
      closesAt: row.closesAt.toISOString(),
      couldNot: row.outcome === 'none' ? row.outcomeReason : null,
    },
    store: {
      id: row.storeId,
      number: row.storeNumber,
      name: row.storeName,
      accessNote: row.accessNote,
    },
    unit:
      row.unitId && row.unitTag && row.unitKind
        ? { id: row.unitId, tag: row.unitTag, kind: row.unitKind }
        : null,
    procedureVersionId: version.id,
    procedure: version.content,
    limits: limitsOf(version.content, await nameplateOf(tenant, row.unitId)),
    inspection: standing
      ? {
          id: standing.id,
          by: standing.by,
          finishedAt: standing.finishedAt.toISOString(),
          note: standing.note,
          readings: standing.readings,
        }
      : null,
    mayClose: mayCloseTask(actor, row, state),
  };
}

/** The nameplate of the motor that is in the unit now; unknown where there is no unit or motor. */
export async function nameplateOf(tenant: Tenant, unitId: string | null): Promise<MotorNameplate> {
  const motor = unitId
    ? await tenant.row<{ nameplate: Partial<MotorNameplate> }>(
        `SELECT nameplate FROM components
         WHERE unit_id = $1 AND kind = 'motor' AND removed_on IS NULL
         ORDER BY installed_on DESC LIMIT 1`,
        [unitId],
      )
    : undefined;
  return { volts: motor?.nameplate.volts ?? null, amps: motor?.nameplate.amps ?? null };
}

function limitsOf(content: ProcedureContent, nameplate: MotorNameplate): Record<string, Limit> {
  const limits: Record<string, Limit> = {};
  for (const step of content.steps) {
    const limit = step.kind === 'number' ? limitOf(step.number, nameplate) : null;
    if (limit) limits[step.key] = limit;
  }
  return limits;
}

function standingInspection(tenant: Tenant, taskId: string): Promise<Standing | undefined> {
  return tenant.row<Standing>(
    `SELECT i.id, p.name AS by, i.finished_at AS "finishedAt", i.note,
       i.procedure_version_id AS "versionId",
       coalesce((SELECT jsonb_agg(jsonb_build_object('withinLimits', g.within_limits, 'reading',
         jsonb_strip_nulls(jsonb_build_object('step', g.step, 'kind', g.kind,
           'ok', CASE WHEN g.kind = 'check' THEN g.number_value = 1 END,
           'value', CASE WHEN g.kind = 'number' THEN g.number_value END,
           'choice', CASE WHEN g.kind = 'choice' THEN g.text_value END,
           'text', CASE WHEN g.kind = 'text' THEN g.text_value END,
           'photoIds', CASE WHEN g.kind = 'photo' THEN to_jsonb(g.photo_ids) END))))
         FROM readings g WHERE g.inspection_id = i.id), '[]') AS readings
     FROM inspections i JOIN people p ON p.id = i.person_id
     WHERE i.task_id = $1 AND i.undone_at IS NULL`,
    [taskId],
  );
}
