import * as z from 'zod';
import type { WindowCounts } from './on-time-rate';

const count = z.int().min(0);

/** The counts behind a rate, as they travel; see {@link WindowCounts}. */
export const windowCounts = z.strictObject({
  onTime: count,
  late: count,
  notDone: count,
  excused: count,
  covered: count,
} satisfies Record<keyof WindowCounts, unknown>);
