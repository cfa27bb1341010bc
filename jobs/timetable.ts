import type { WorkerServices } from './services';

/** One piece of recurring work. */
export interface Job {
  readonly name: string;
  /** Length of a slot; each slot is worked once, by whichever worker comes first. */
  readonly everySeconds: number;
  /** @param slot the instant at which the slot began */
  run(services: WorkerServices, slot: Date): Promise<void>;
}

/** The timetable as data: what the worker does and how often. */
export const timetable: readonly Job[] = [];
