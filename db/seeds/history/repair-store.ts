import type { HistoryRows } from './history-rows';
import type { HistoryUnit, HistoryWorld, OpenFinding, StoreLife } from './history-world';
import { putRight } from './unit-condition';

/** Does the repairs that have come by `now`: settles their findings and changes the parts. */
export function repairStore(
  world: HistoryWorld,
  store: StoreLife,
  now: Date,
  rows: HistoryRows,
): void {
  for (const finding of takeDue(store, now)) {
    settle(store, finding, rows);
    for (const { condition } of store.units) putRight(condition, finding.cause, []);
  }
  for (const unit of store.units) {
    for (const finding of takeDue(unit, now)) repairOne(world, store, unit, finding, rows);
  }
}

function takeDue(owner: { open: OpenFinding[] }, now: Date): OpenFinding[] {
  const due = owner.open.filter(({ repair }) => repair.at <= now);
  if (due.length > 0) owner.open = owner.open.filter(({ repair }) => repair.at > now);
  return due;
}

function settle(
  store: StoreLife,
  { id, repair: { at, note } }: OpenFinding,
  rows: HistoryRows,
): void {
  const row = rows.findings.get(id);
  if (!row) return;
  Object.assign(row, {
    settled_at: at,
    settled_by: store.technicianId,
    settled_note: note,
    version: 1,
  });
}

function repairOne(
  world: HistoryWorld,
  store: StoreLife,
  unit: HistoryUnit,
  finding: OpenFinding,
  rows: HistoryRows,
): void {
  settle(store, finding, rows);
  const { id, cause, severity, repair } = finding;
  const { at, note } = repair;
  if (severity === 'watch') {
    rows.event(at, store.technicianId, id, 'settled', {});
    return;
  }
  rows.repairs.push({
    id: world.newId(),
    finding_id: id,
    unit_id: unit.id,
    cause,
    replaced: repair.replaced,
    minutes: repair.minutes,
    parts_cents: repair.partsCents,
    labour_cents: repair.labourCents,
    note,
    done_at: at,
    done_by: store.technicianId,
  });
  rows.event(at, store.technicianId, id, 'repaired', { replaced: repair.replaced, cause });
  for (const kind of repair.replaced) replacePart(world, unit, kind, at, cause, rows);
  putRight(unit.condition, cause, repair.replaced);
}

function replacePart(
  world: HistoryWorld,
  unit: HistoryUnit,
  kind: string,
  at: Date,
  cause: string,
  rows: HistoryRows,
): void {
  const old = unit.fitted.get(kind);
  const on = at.toISOString().slice(0, 10);
  if (old) rows.removePart(old.id, on, cause);
  const fitted = {
    id: world.newId(),
    model: old?.model ?? '',
    nameplate: old?.nameplate ?? {},
    pumpFace: old?.pumpFace ?? null,
  };
  rows.fitPart({ ...fitted, unitId: unit.id, kind, on });
  unit.fitted.set(kind, fitted);
}
