import { randomUUID } from 'node:crypto';
import type { BodyOf } from '@shared/contract/endpoint';
import type { StepReading, closeTask as endpoint } from '@shared/inspections/inspections-contract';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import {
  type MotorNameplate,
  findingOf,
  limitOf,
  withinLimit,
} from '@shared/procedures/within-limit';
import { Problem, conflict, forbidden, invalid } from '@shared/problem';
import type { TaskState } from '@shared/tasks/task-state';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { photoFaults } from '../uploads/photo-faults';
import { readingFaults } from './check-readings';
import { mayCloseTask } from './inspection-policy';
import { nameplatesOf, unknownNameplate } from './sheet-parts';
import { type TaskRow, stateOf } from './task-rows';

export type InspectionDraft = BodyOf<typeof endpoint>;

/**
 * Closes a task with an inspection: keeps the readings, turns those out of limit into findings, and
 * marks the task done. The same inspection sent again changes nothing.
 * @param row the task, locked
 * @throws Problem 409 when the task is decided already or not open, 422 for readings that do not fit
 */
export async function closeTask(
  tenant: Tenant,
  actor: Actor,
  row: TaskRow,
  draft: InspectionDraft,
  now: Date,
): Promise<{ state: TaskState; findings: number }> {
  const state = stateOf(row, now);
  if (row.outcome !== 'none') {
    const before = await tenant.row('SELECT id FROM inspections WHERE id = $1 AND task_id = $2', [
      draft.id,
      row.id,
    ]);
    if (before) return { state, findings: 0 };
    throw conflict('The task was closed meanwhile.');
  }
  if (state === 'planned') throw new Problem(409, 'not-open', 'This task is not open yet.');
  if (state === 'missed') throw new Problem(409, 'lapsed', 'This task can no longer be done.');
  if (!mayCloseTask(actor, row, state)) throw forbidden();

  const version = await tenant.row<{ content: ProcedureContent }>(
    `SELECT content FROM procedure_versions
     WHERE id = $1 AND procedure_id = $2 AND published_at IS NOT NULL`,
    [draft.procedureVersionId, row.procedureId],
  );
  if (!version) {
    throw invalid([
      { field: 'procedureVersionId', reason: 'unknown', message: 'This is another procedure.' },
    ]);
  }
  const faults = [
    ...readingFaults(version.content, draft.readings),
    ...(await photoFaults(tenant, row.storeId, photoFields(draft))),
  ];
  if (faults.length > 0) throw invalid(faults);

  const nameplates = await nameplatesOf(tenant, row.unitId ? [row.unitId] : []);
  const nameplate = nameplates.get(row.unitId ?? '') ?? unknownNameplate;
  await tenant.rows(
    `INSERT INTO inspections (id, organisation_id, task_id, procedure_version_id, store_id, unit_id,
       person_id, started_at, finished_at, note)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10)`,
    [
      draft.id,
      tenant.organisationId,
      row.id,
      draft.procedureVersionId,
      row.storeId,
      row.unitId,
      actor.personId,
      draft.startedAt,
      now,
      draft.note,
    ],
  );
  await keepReadings(tenant, version.content, draft, nameplate);
  const findings = await keepFindings(tenant, actor, row, version.content, draft, nameplate, now);
  await tenant.rows(
    `UPDATE tasks SET outcome = 'done', outcome_at = $3, outcome_by = $4, outcome_reason = NULL,
       version = version + 1
     WHERE id = $1 AND occurs_local = $2`,
    [row.id, row.occursLocal, now, actor.personId],
  );
  await markStale(tenant, row, now);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'task',
    subjectId: row.id,
    action: row.audience === 'store' ? 'acknowledged' : 'done',
    detail: { inspectionId: draft.id, findings },
  });
  return { state: now < row.closesAt ? 'done' : 'done-late', findings };
}

/** The step that each photo was taken for. */
function photoFields(draft: InspectionDraft): Map<string, string> {
  return new Map(
    draft.readings.flatMap((reading) =>
      reading.kind === 'photo'
        ? reading.photoIds.map((id) => [id, `readings.${reading.step}`] as const)
        : [],
    ),
  );
}

/** A closed window whose outcome changes must be counted again. */
export async function markStale(tenant: Tenant, row: TaskRow, now: Date): Promise<void> {
  if (now < row.closesAt) return;
  await tenant.rows(
    `INSERT INTO stale_days (organisation_id, store_id, day) VALUES ($1, $2, $3)
     ON CONFLICT DO NOTHING`,
    [tenant.organisationId, row.storeId, row.closesOn],
  );
}

async function keepReadings(
  tenant: Tenant,
  content: ProcedureContent,
  draft: InspectionDraft,
  nameplate: MotorNameplate,
): Promise<void> {
  const rows = draft.readings.map((reading) => {
    const step = content.steps.find(({ key }) => key === reading.step);
    const limit = step?.kind === 'number' ? limitOf(step.number, nameplate) : null;
    return {
      step: reading.step,
      kind: reading.kind,
      number_value: numberOf(reading),
      text_value: textOf(reading),
      unit: step?.kind === 'number' ? step.number.unit : null,
      limit_low: limit?.low ?? null,
      limit_high: limit?.high ?? null,
      within_limits: step ? withinLimit(step, reading, nameplate) : null,
      photo_ids: reading.kind === 'photo' ? reading.photoIds : [],
    };
  });
  await tenant.rows(
    `INSERT INTO readings (organisation_id, inspection_id, step, kind, number_value, text_value, unit,
       limit_low, limit_high, within_limits, photo_ids)
     SELECT $1, $2, step, kind, number_value, text_value, unit, limit_low, limit_high, within_limits,
       ARRAY(SELECT jsonb_array_elements_text(photo_ids))::uuid[]
     FROM jsonb_to_recordset($3::jsonb) AS it (step text, kind text, number_value float8,
       text_value text, unit text, limit_low float8, limit_high float8, within_limits boolean,
       photo_ids jsonb)`,
    [tenant.organisationId, draft.id, JSON.stringify(rows)],
  );
}

const numberOf = (reading: StepReading) => {
  if (reading.kind === 'check') return reading.ok ? 1 : 0;
  return reading.kind === 'number' ? reading.value : null;
};

const textOf = (reading: StepReading) => {
  if (reading.kind === 'choice') return reading.choice;
  return reading.kind === 'text' ? reading.text : null;
};

async function keepFindings(
  tenant: Tenant,
  actor: Actor,
  row: TaskRow,
  content: ProcedureContent,
  draft: InspectionDraft,
  nameplate: MotorNameplate,
  now: Date,
): Promise<number> {
  const found = draft.readings.flatMap((reading) => {
    const step = content.steps.find(({ key }) => key === reading.step);
    const finding = step && findingOf(step, reading, nameplate);
    return finding ? [{ id: randomUUID(), ...finding }] : [];
  });
  if (found.length === 0) return 0;
  await tenant.rows(
    `INSERT INTO findings (id, organisation_id, store_id, unit_id, component_id, component_kind,
       inspection_id, cause, severity, note, found_at, found_by)
     SELECT it.id, $1, $2, $3,
       (SELECT c.id FROM components c WHERE c.unit_id = $3 AND c.kind = it.component
         AND c.removed_on IS NULL ORDER BY c.installed_on DESC LIMIT 1),
       it.component, $4, it.cause, it.severity, $5, $6, $7
     FROM jsonb_to_recordset($8::jsonb) AS it (id uuid, component text, cause text, severity text)`,
    [
      tenant.organisationId,
      row.storeId,
      row.unitId,
      draft.id,
      draft.note,
      now,
      actor.personId,
      JSON.stringify(found),
    ],
  );
  return found.length;
}
