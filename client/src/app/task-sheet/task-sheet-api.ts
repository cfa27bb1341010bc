import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type {
  closeTask,
  readTaskHistory,
  readTaskSheet,
  reportCouldNot,
  undoInspection,
} from '@shared/inspections/inspections-contract';
import type { SentBody } from '../api/api';
import { Api } from '../api/api';

export type TaskSheet = ReplyOf<typeof readTaskSheet>;
export type InspectionDraft = SentBody<typeof closeTask>;
export type SentReading = InspectionDraft['readings'][number];
export type CouldNot = SentBody<typeof reportCouldNot>;
export type TaskEvent = ReplyOf<typeof readTaskHistory>['events'][number];

/** Everything the sheet of a task asks of the server. */
@Injectable({ providedIn: 'root' })
export class TaskSheetApi {
  private readonly api = inject(Api);

  sheet(id: () => string) {
    return this.api.resource<typeof readTaskSheet>('/tasks/:id/sheet', () => ({
      params: { id: id() },
    }));
  }

  history(id: () => string) {
    return this.api.resource<typeof readTaskHistory>('/tasks/:id/history', () => ({
      params: { id: id() },
    }));
  }

  close(id: string, body: InspectionDraft) {
    return this.api.call<typeof closeTask>('PUT', '/tasks/:id/inspection', {
      params: { id },
      body,
    });
  }

  undo(id: string) {
    return this.api.call<typeof undoInspection>('DELETE', '/tasks/:id/inspection', {
      params: { id },
    });
  }

  couldNot(id: string, body: CouldNot) {
    return this.api.call<typeof reportCouldNot>('POST', '/tasks/:id/could-not', {
      params: { id },
      body,
    });
  }
}
