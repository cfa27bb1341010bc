import type { Cause, Severity } from '@shared/findings/cause';
import type { StepReading } from '@shared/inspections/inspections-contract';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { ComponentKind } from '@shared/procedures/step-kind';
import type { MotorNameplate } from '@shared/procedures/within-limit';
import type { Tenant } from '@db/tenant-transaction';

/** The inspection that closed a task, with what it found. */
export interface StandingInspection {
  taskId: string;
  id: string;
  personId: string;
  by: string;
  finishedAt: Date;
  note: string;
  versionId: string;
  readings: { reading: StepReading; withinLimits: boolean | null }[];
  findings: {
    id: string;
    cause: Cause;
    severity: Severity;
    componentKind: ComponentKind | null;
    settled: boolean;
  }[];
}

/** A published version of a procedure. */
export interface PublishedVersion {
  id: string;
  procedureId: string;
  content: ProcedureContent;
  newest: boolean;
}

/** The inspections that stand for these tasks; undone ones do not. */
export function standingInspections(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<StandingInspection[]> {
  return tenant.rows<StandingInspection>(
    `SELECT i.task_id AS "taskId", i.id, i.person_id AS "personId", p.name AS by,
       i.finished_at AS "finishedAt", i.note, i.procedure_version_id AS "versionId",
       coalesce((SELECT jsonb_agg(jsonb_build_object('withinLimits', g.within_limits, 'reading',
         jsonb_strip_nulls(jsonb_build_object('step', g.step, 'kind', g.kind,
           'ok', CASE WHEN g.kind = 'check' THEN g.number_value = 1 END,
           'value', CASE WHEN g.kind = 'number' THEN g.number_value END,
           'choice', CASE WHEN g.kind = 'choice' THEN g.text_value END,
           'text', CASE WHEN g.kind = 'text' THEN g.text_value END,
           'photoIds', CASE WHEN g.kind = 'photo' THEN to_jsonb(g.photo_ids) END))))
         FROM readings g WHERE g.inspection_id = i.id), '[]') AS readings,
       coalesce((SELECT jsonb_agg(jsonb_build_object('id', f.id, 'cause', f.cause,
           'severity', f.severity, 'componentKind', f.component_kind,
           'settled', f.settled_at IS NOT NULL)
           ORDER BY array_position(ARRAY['stop', 'plan', 'watch'], f.severity), f.id)
         FROM findings f WHERE f.inspection_id = i.id), '[]') AS findings
     FROM inspections i JOIN people p ON p.id = i.person_id
     WHERE i.task_id = ANY($1::uuid[]) AND i.undone_at IS NULL`,
    [taskIds],
  );
}

/** The newest published version of each procedure, and the older ones asked for by id. */
export function publishedVersions(
  tenant: Tenant,
  procedureIds: readonly string[],
  versionIds: readonly string[],
): Promise<PublishedVersion[]> {
  return tenant.rows<PublishedVersion>(
    `SELECT id, procedure_id AS "procedureId", content, newest FROM (
       SELECT id, procedure_id, content,
         number = max(number) OVER (PARTITION BY procedure_id) AS newest
       FROM procedure_versions
       WHERE procedure_id = ANY($1::uuid[]) AND published_at IS NOT NULL
     ) v WHERE newest OR id = ANY($2::uuid[])`,
    [procedureIds, versionIds],
  );
}

/** Nameplates of the motors that are in the units now, by unit; without a motor there is none. */
export async function nameplatesOf(
  tenant: Tenant,
  unitIds: readonly string[],
): Promise<Map<string, MotorNameplate>> {
  if (unitIds.length === 0) return new Map();
  const motors = await tenant.rows<{ unitId: string; nameplate: Partial<MotorNameplate> }>(
    `SELECT DISTINCT ON (unit_id) unit_id AS "unitId", nameplate FROM components
     WHERE unit_id = ANY($1::uuid[]) AND kind = 'motor' AND removed_on IS NULL
     ORDER BY unit_id, installed_on DESC`,
    [unitIds],
  );
  return new Map(
    motors.map(({ unitId, nameplate }) => [
      unitId,
      { volts: nameplate.volts ?? null, amps: nameplate.amps ?? null },
    ]),
  );
}

/** What is known of a motor before anyone has read its nameplate. */
export const unknownNameplate: MotorNameplate = { volts: null, amps: null };
