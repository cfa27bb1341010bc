import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { listChains, listRegions, listStores, readStore } from '@shared/fleet/fleet-contract';
import type { listRules } from '@shared/programmes/programmes-contract';
import type {
  assignTasks,
  deferTasks,
  excuseTasks,
  undoTaskChange,
} from '@shared/tasks/task-changes-contract';
import type {
  explainTask,
  exportTasks,
  listTasks,
  readTask,
  readTaskBoard,
  readTaskCalendar,
} from '@shared/tasks/tasks-contract';
import type { readPlan } from '@shared/visits/visits-contract';
import type { Asked, SentBody } from '../api/api';
import { Api } from '../api/api';

export type Task = ReplyOf<typeof readTask>;
export type TaskList = ReplyOf<typeof listTasks>;
export type TaskQuery = NonNullable<Asked<typeof listTasks>['query']>;
export type Board = ReplyOf<typeof readTaskBoard>;
export type BoardRow = Board['rows'][number];
export type BoardQuery = NonNullable<Asked<typeof readTaskBoard>['query']>;
export type StateCounts = BoardRow['cells'][number]['counts'];
export type Calendar = ReplyOf<typeof readTaskCalendar>;
export type CalendarQuery = NonNullable<Asked<typeof readTaskCalendar>['query']>;
export type TaskChange = ReplyOf<typeof assignTasks>;
export type Assigning = SentBody<typeof assignTasks>;
export type Excusing = SentBody<typeof excuseTasks>;
export type Deferring = SentBody<typeof deferTasks>;
export type Selection = Assigning['selection'];
export type Why = ReplyOf<typeof explainTask>;

/** Everything that the planner's pages of tasks ask of the server. */
@Injectable({ providedIn: 'root' })
export class TasksApi {
  private readonly api = inject(Api);

  list(query: () => TaskQuery | undefined) {
    return this.api.resource<typeof listTasks>('/tasks', () => {
      const asked = query();
      return asked ? { query: asked } : undefined;
    });
  }

  board(query: () => BoardQuery) {
    return this.api.resource<typeof readTaskBoard>('/tasks/board', () => ({ query: query() }));
  }

  calendar(query: () => CalendarQuery) {
    return this.api.resource<typeof readTaskCalendar>('/tasks/calendar', () => ({
      query: query(),
    }));
  }

  one(id: () => string) {
    return this.api.resource<typeof readTask>('/tasks/:id', () => ({ params: { id: id() } }));
  }

  why(id: () => string) {
    return this.api.resource<typeof explainTask>('/tasks/:id/why', () => ({
      params: { id: id() },
    }));
  }

  assign(body: Assigning) {
    return this.api.call<typeof assignTasks>('POST', '/tasks/assign', { body });
  }

  excuse(body: Excusing) {
    return this.api.call<typeof excuseTasks>('POST', '/tasks/excuse', { body });
  }

  defer(body: Deferring) {
    return this.api.call<typeof deferTasks>('POST', '/tasks/defer', { body });
  }

  undo(id: string) {
    return this.api.call<typeof undoTaskChange>('POST', '/tasks/changes/:id/undo', {
      params: { id },
    });
  }

  /** Where the list can be taken away as a file. */
  exportAddress(query: TaskQuery, format: 'csv' | 'xlsx'): string {
    return this.api.address<typeof exportTasks>('/tasks/export', { query: { ...query, format } });
  }

  regions() {
    return this.api.resource<typeof listRegions>('/regions', () => ({ query: { pageSize: 200 } }));
  }

  chains() {
    return this.api.resource<typeof listChains>('/chains', () => ({ query: { pageSize: 200 } }));
  }

  rules() {
    return this.api.resource<typeof listRules>('/rules', () => ({}));
  }

  /** Who can be sent; asked for only by those who plan visits. */
  technicians(ask: () => boolean, from: string) {
    return this.api.resource<typeof readPlan>('/routes', () =>
      ask() ? { query: { from, days: 1 } } : undefined,
    );
  }

  store(id: () => string) {
    return this.api.resource<typeof readStore>('/stores/:id', () =>
      id() ? { params: { id: id() } } : undefined,
    );
  }

  stores(q: string) {
    return this.api.call<typeof listStores>('GET', '/stores', { query: { q, pageSize: 12 } });
  }
}
