import { rollUpCompliance } from './compliance/roll-up';
import { makeDigests } from './digests/make-digests';
import { runLongJobs } from './long-jobs/run-long-jobs';
import { queueReminders } from './mail/queue-reminders';
import { sendLetters } from './mail/send-letters';
import type { WorkerServices } from './services';

/** One piece of recurring work. */
export interface Job {
  readonly name: string;
  /** Length of a slot; each slot is worked once, by whichever worker comes first. */
  readonly everySeconds: number;
  /** @param slot the instant at which the slot began */
  run(services: WorkerServices, slot: Date): Promise<unknown>;
}

const minutes = (count: number) => count * 60;

/** The timetable as data: what the worker does and how often. */
export const timetable: readonly Job[] = [
  { name: 'roll-up-compliance', everySeconds: minutes(5), run: rollUpCompliance },
  { name: 'queue-reminders', everySeconds: minutes(5), run: queueReminders },
  { name: 'make-digests', everySeconds: minutes(15), run: makeDigests },
  { name: 'long-jobs', everySeconds: 5, run: runLongJobs },
  { name: 'send-letters', everySeconds: 10, run: (services) => sendLetters(services) },
];
