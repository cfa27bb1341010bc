import type { ImportField } from '@shared/imports/import-fields';
import type { ProblemReason, RowProblem } from '@shared/imports/problem-words';
import type { ReadRow } from '@shared/imports/read-row';
import { type FleetChanges, noChanges } from './fleet-records';

/** What one row is about to do, kept apart until it is known to be without fault. */
export class RowDraft {
  readonly problems: RowProblem[];
  readonly changes: FleetChanges = noChanges();
  /** To be done once the row is taken: later rows then know of what this one did. */
  readonly whenTaken: (() => void)[] = [];

  constructor(readonly row: ReadRow) {
    this.problems = [...row.problems];
  }

  get isBad(): boolean {
    return this.problems.length > 0;
  }

  fault(
    field: ImportField,
    reason: ProblemReason,
    value = '',
    params?: Readonly<Record<string, string | number>>,
  ): void {
    this.problems.push({ field, reason, value: value.slice(0, 80), ...(params ? { params } : {}) });
  }

  /** A field without which the row says nothing, unless it is known already to be unreadable. */
  need(field: ImportField): void {
    if (!this.problems.some((it) => it.field === field)) this.fault(field, 'needed');
  }

  /** A day that must not lie ahead of the store's own. */
  notAhead(field: ImportField, day: string | undefined, today: string): void {
    if (day !== undefined && day > today) this.fault(field, 'in-future', day);
  }
}
