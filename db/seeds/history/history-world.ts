import type { CalendarDate } from '@shared/calendar/calendar-date';
import type { Cause, Severity } from '@shared/findings/cause';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { MotorNameplate } from '@shared/procedures/within-limit';
import type { UnitCondition } from './unit-condition';
import type { RepairPlan } from './repairs';

/** A task as the simulation needs it. */
export interface HistoryTask {
  readonly id: string;
  readonly code: string;
  readonly audience: 'technician' | 'store';
  readonly storeId: string;
  readonly unitId: string | null;
  readonly occursLocal: string;
  readonly dueOn: CalendarDate;
  readonly opensAt: Date;
  readonly dueAt: Date;
  readonly closesAt: Date;
  readonly lapsesAt: Date;
}

/** A finding that waits for its repair. */
export interface OpenFinding {
  readonly id: string;
  readonly cause: Cause;
  readonly severity: Severity;
  readonly repair: RepairPlan;
}

export interface FittedPart {
  readonly id: string;
  readonly model: string;
  readonly nameplate: object;
  readonly pumpFace: string | null;
}

export interface HistoryUnit {
  readonly id: string;
  readonly condition: UnitCondition;
  readonly nameplate: MotorNameplate;
  readonly fitted: Map<string, FittedPart>;
  open: OpenFinding[];
}

export interface StoreLife {
  readonly id: string;
  readonly units: readonly HistoryUnit[];
  readonly discipline: number;
  readonly technicianReliability: number;
  /** Share of the coming days' tasks that have a technician already. */
  readonly plannedAhead: number;
  readonly technicianId: string;
  readonly managerId: string;
  readonly plannerId: string;
  /** The day on which water was pumped through the filter. */
  readonly waterDay: CalendarDate | null;
  day: CalendarDate;
  missedChecks: number;
  /** Until the next no-water check tells. */
  waterGotIn: boolean;
  /** Findings of the store as a whole, not of one unit. */
  open: OpenFinding[];
}

export interface HistoryWorld {
  readonly stores: ReadonlyMap<string, StoreLife>;
  /** By the procedure's code: the version in force. */
  readonly procedures: ReadonlyMap<
    string,
    { readonly versionId: string; readonly content: ProcedureContent }
  >;
  readonly newId: () => string;
}
