import { computed, effect, inject, Injectable, signal, untracked } from '@angular/core';
import type { Reading } from '@shared/procedures/within-limit';
import { newId } from '../api/new-id';
import { DeviceStore } from '../offline/device-store';
import type { Answers } from './answers';
import { missingSteps, sentReadings } from './answers';
import type { InspectionDraft, TaskSheet } from './task-sheet-api';

/** What is kept of a task that is being done. */
interface Draft {
  readonly inspectionId: string;
  readonly versionId: string;
  readonly startedAt: string;
  readonly cautionsSeen: boolean;
  readonly note: string;
  readonly answers: Answers;
}

/**
 * The answers to one task, kept on the device at every change, so that neither a reload nor an
 * empty battery loses one. Provided by each page that does tasks.
 */
@Injectable()
export class SheetDraft {
  private readonly device = inject(DeviceStore);
  private readonly sheet = signal<TaskSheet | null>(null);
  private readonly draft = signal<Draft | null>(null);

  /** False until the device was asked what it keeps. */
  readonly ready = computed(() => this.draft() !== null);
  readonly cautionsSeen = computed(() => this.draft()?.cautionsSeen ?? false);
  readonly answers = computed(() => this.draft()?.answers ?? {});
  readonly note = computed(() => this.draft()?.note ?? '');
  /** Required steps without an answer. */
  readonly missing = computed(() =>
    missingSteps(this.sheet()?.procedure.steps ?? [], this.answers()),
  );
  /** True when something was entered that the server does not have. */
  readonly begun = computed(() => Object.keys(this.answers()).length > 0 || this.note() !== '');
  private touched = false;

  constructor() {
    effect(() => {
      const [draft, sheet] = [this.draft(), untracked(this.sheet)];
      if (draft && sheet && this.touched) void this.device.put('drafts', sheet.task.id, draft);
    });
  }

  /**
   * Takes up a task where it was left. Answers given to an older version of the procedure are kept
   * for the steps that are the same.
   */
  async takeUp(sheet: TaskSheet): Promise<void> {
    const same = this.sheet()?.task.id === sheet.task.id;
    this.sheet.set(sheet);
    if (same && this.draft()) return;
    const kept = await this.device.get<Draft>('drafts', sheet.task.id);
    this.touched = kept !== undefined;
    this.draft.set({
      inspectionId: newId(),
      startedAt: new Date().toISOString(),
      cautionsSeen: false,
      note: '',
      answers: {},
      ...kept,
      versionId: sheet.procedureVersionId,
      ...(kept && kept.versionId !== sheet.procedureVersionId ? { cautionsSeen: false } : {}),
    });
  }

  answer(key: string, reading: Reading | null): void {
    this.change(({ answers }) => {
      const { [key]: _, ...others } = answers;
      return { answers: reading ? { ...others, [key]: reading } : others };
    });
  }

  write(note: string): void {
    this.change(() => ({ note }));
  }

  seeCautions(): void {
    this.change(() => ({ cautionsSeen: true }));
  }

  /** What is sent to close the task; the same id however often it is sent. */
  inspection(): InspectionDraft | null {
    const [draft, sheet] = [this.draft(), this.sheet()];
    if (!draft || !sheet) return null;
    return {
      id: draft.inspectionId,
      procedureVersionId: draft.versionId,
      startedAt: draft.startedAt,
      note: draft.note.trim(),
      readings: sentReadings(sheet.procedure.steps, draft.answers),
    };
  }

  /** Takes the answers of a closed task up again, after the closing was taken back. */
  restore({ note, readings }: NonNullable<TaskSheet['inspection']>): void {
    const answers = Object.fromEntries(
      readings.map(({ reading }) => [reading.step, reading as Reading]),
    );
    this.change(() => ({ answers, note, cautionsSeen: true }));
  }

  /** The task was closed: the device forgets its answers, and a next closing is another one. */
  async closed(): Promise<void> {
    this.touched = false;
    this.draft.update(
      (draft) => draft && { ...draft, inspectionId: newId(), answers: {}, note: '' },
    );
    const sheet = this.sheet();
    if (sheet) await this.device.remove('drafts', sheet.task.id);
  }

  private change(make: (draft: Draft) => Partial<Draft>): void {
    this.touched = true;
    this.draft.update((draft) => draft && { ...draft, ...make(draft) });
  }
}
