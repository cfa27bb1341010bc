import type { ReplyOf } from '@shared/contract/endpoint';
import type { readTaskSheet } from '@shared/inspections/inspections-contract';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import { type Limit, type MotorNameplate, limitOf } from '@shared/procedures/within-limit';
import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { mayCloseTask, mayUndo } from './inspection-policy';
import {
  type PublishedVersion,
  type StandingInspection,
  nameplatesOf,
  publishedVersions,
  standingInspections,
  unknownNameplate,
} from './sheet-parts';
import { type TaskRow, stateOf } from './task-rows';

export type TaskSheet = ReplyOf<typeof readTaskSheet>;

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
  const [sheet] = await presentTaskSheets(tenant, actor, [row], now);
  if (!sheet) throw new Problem(409, 'not-published', 'This procedure is not published yet.');
  return sheet;
}

/** Sheets of several tasks in three reads; tasks of an unpublished procedure have none. */
export async function presentTaskSheets(
  tenant: Tenant,
  actor: Actor,
  rows: readonly TaskRow[],
  now: Date,
): Promise<TaskSheet[]> {
  if (rows.length === 0) return [];
  const standing = await standingInspections(
    tenant,
    rows.map(({ id }) => id),
  );
  const versions = await publishedVersions(
    tenant,
    rows.map(({ procedureId }) => procedureId),
    standing.map(({ versionId }) => versionId),
  );
  const nameplates = await nameplatesOf(
    tenant,
    rows.flatMap(({ unitId }) => unitId ?? []),
  );
  return rows.flatMap((row) => {
    const inspection = standing.find(({ taskId }) => taskId === row.id);
    const version = versionFor(row, inspection, versions);
    const nameplate = nameplates.get(row.unitId ?? '') ?? unknownNameplate;
    return version ? [sheetOf(actor, row, inspection, version, nameplate, now)] : [];
  });
}

function versionFor(
  row: TaskRow,
  inspection: StandingInspection | undefined,
  versions: readonly PublishedVersion[],
): PublishedVersion | undefined {
  if (inspection) return versions.find(({ id }) => id === inspection.versionId);
  return versions.find(({ procedureId, newest }) => procedureId === row.procedureId && newest);
}

function sheetOf(
  actor: Actor,
  row: TaskRow,
  inspection: StandingInspection | undefined,
  version: PublishedVersion,
  nameplate: MotorNameplate,
  now: Date,
): TaskSheet {
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
    limits: limitsOf(version.content, nameplate),
    inspection: inspection
      ? {
          id: inspection.id,
          by: inspection.by,
          finishedAt: inspection.finishedAt.toISOString(),
          note: inspection.note,
          readings: inspection.readings,
          findings: inspection.findings,
        }
      : null,
    mayClose: mayCloseTask(actor, row, state),
    mayUndo:
      row.outcome === 'done' && inspection !== undefined
        ? mayUndo(actor, row, inspection.personId)
        : false,
  };
}

function limitsOf(content: ProcedureContent, nameplate: MotorNameplate): Record<string, Limit> {
  const limits: Record<string, Limit> = {};
  for (const step of content.steps) {
    const limit = step.kind === 'number' ? limitOf(step.number, nameplate) : null;
    if (limit) limits[step.key] = limit;
  }
  return limits;
}
