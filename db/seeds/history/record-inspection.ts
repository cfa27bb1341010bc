import type { StepReading } from '@shared/inspections/inspections-contract';
import { findingOf, limitOf, withinLimit } from '@shared/procedures/within-limit';
import { crewAnswers, technicianAnswers } from './answers';
import type { HistoryRows } from './history-rows';
import type { HistoryTask, HistoryUnit, HistoryWorld, StoreLife } from './history-world';
import { planRepair } from './repairs';

interface Visit {
  readonly world: HistoryWorld;
  readonly store: StoreLife;
  readonly unit: HistoryUnit | undefined;
  readonly task: HistoryTask;
  readonly by: string;
  readonly at: Date;
  readonly random: () => number;
}

const unknown = { volts: null, amps: null };

/** Writes down an inspection as the product does: readings with their limits, and what they find. */
export function recordInspection(visit: Visit, rows: HistoryRows): void {
  const { world, store, unit, task, by, at, random } = visit;
  const procedure = world.procedures.get(task.code);
  if (!procedure) throw new Error(`The demo world has no procedure ${task.code}.`);
  const nameplate = unit?.nameplate ?? unknown;
  const answers = unit
    ? technicianAnswers(task.code, unit.condition, nameplate, random)
    : crewAnswers(task.code, crewView(store), random);
  const inspectionId = world.newId();
  const minutes = procedure.content.minutes * (0.7 + 0.8 * random());
  rows.inspections.push({
    id: inspectionId,
    task_id: task.id,
    procedure_version_id: procedure.versionId,
    store_id: store.id,
    unit_id: unit?.id ?? null,
    person_id: by,
    started_at: new Date(at.getTime() - minutes * 60_000),
    finished_at: at,
    note: '',
  });
  let findings = 0;
  for (const step of procedure.content.steps) {
    const answer = answers[step.key];
    if (!answer) continue;
    const reading = { ...answer, step: step.key } as StepReading;
    const limit = step.kind === 'number' ? limitOf(step.number, nameplate) : null;
    rows.readings.push({
      inspection_id: inspectionId,
      step: step.key,
      kind: reading.kind,
      number_value: numberOf(reading),
      text_value: reading.kind === 'choice' ? reading.choice : null,
      unit: step.kind === 'number' ? step.number.unit : null,
      limit_low: limit?.low ?? null,
      limit_high: limit?.high ?? null,
      within_limits: withinLimit(step, reading, nameplate),
      photo_ids: [],
    });
    const found = findingOf(step, reading, nameplate);
    if (found && keepFinding(visit, inspectionId, found, rows)) findings += 1;
  }
  if (task.code === 'no-water') store.waterGotIn = false;
  if (answers['o-ring'] && findings === 0) changeORings(store);
  const action = task.audience === 'store' ? 'acknowledged' : 'done';
  rows.event(at, by, task.id, action, { inspectionId, findings });
}

/** A fault already known and waiting for its repair is not written down a second time. */
function keepFinding(
  { world, store, unit, by, at, random }: Visit,
  inspectionId: string,
  found: NonNullable<ReturnType<typeof findingOf>>,
  rows: HistoryRows,
): boolean {
  if ((unit ?? store).open.some(({ cause }) => cause === found.cause)) return false;
  const id = world.newId();
  const fitted = found.component ? unit?.fitted.get(found.component) : undefined;
  rows.findings.set(id, {
    id,
    store_id: store.id,
    unit_id: unit?.id ?? null,
    component_id: fitted?.id ?? null,
    component_kind: found.component,
    inspection_id: inspectionId,
    cause: found.cause,
    severity: found.severity,
    note: '',
    photo_ids: [],
    found_at: at,
    found_by: by,
    settled_at: null,
    settled_by: null,
    settled_note: null,
    version: 0,
  });
  const repair = planRepair(found.cause, found.severity, at, random);
  const owner = unit ?? store;
  owner.open.push({ id, cause: found.cause, severity: found.severity, repair });
  return true;
}

/** Crews change a worn ring themselves; one they could not get becomes a finding. */
function changeORings(store: StoreLife): void {
  for (const { condition } of store.units) condition.oRingBad = false;
}

function crewView(store: StoreLife) {
  return {
    waterGotIn: store.waterGotIn,
    oRingBad: store.units.some(({ condition }) => condition.oRingBad),
  };
}

const numberOf = (reading: StepReading) => {
  if (reading.kind === 'check') return reading.ok ? 1 : 0;
  return reading.kind === 'number' ? reading.value : null;
};
