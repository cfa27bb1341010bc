import * as z from 'zod';
import { windowCounts } from '../compliance/window-counts';
import { causes } from '../findings/cause';

const rate = z.number().min(0).max(1).nullable();

const place = { storeId: z.uuid(), number: z.string(), name: z.string() };

/**
 * The figures of one chain's month as they stood when it was over. Stored as they are, so that the
 * letter and the page keep saying the same however the data change later.
 */
export const digestContent = z.strictObject({
  /** Raised when the shape changes, so that old digests stay readable. */
  shape: z.literal(1),
  chainName: z.string(),
  /** `YYYY-MM`. */
  month: z.string(),
  counts: windowCounts,
  rate,
  previousRate: rate,
  /** Percentage points against the month before. */
  change: z.number().nullable(),
  /** The months up to and with this one, oldest first. */
  months: z.array(z.strictObject({ month: z.string(), counts: windowCounts, rate })),
  /** Lowest rate first; stores without a closed window last. */
  stores: z.array(
    z.strictObject({ ...place, counts: windowCounts, rate, change: z.number().nullable() }),
  ),
  /** Tasks overdue as the month ended, by store, most first. */
  overdue: z.strictObject({
    count: z.int(),
    stores: z.array(
      z.strictObject({
        ...place,
        count: z.int(),
        /** Local day on which the oldest of their windows closed. */
        oldestClosedOn: z.iso.date(),
      }),
    ),
  }),
  findings: z.strictObject({
    count: z.int(),
    /** Of those found in the month, not settled as it ended. */
    unsettled: z.int(),
    /** Most first. */
    byCause: z.array(
      z.strictObject({ cause: z.enum(causes), count: z.int(), stop: z.int(), unsettled: z.int() }),
    ),
  }),
  repairs: z.strictObject({ count: z.int(), partsCents: z.int(), labourCents: z.int() }),
  /** Findings that say "stop using it", whenever found, not settled as the month ended. */
  stopped: z.array(
    z.strictObject({
      ...place,
      findingId: z.uuid(),
      unitTag: z.string().nullable(),
      cause: z.enum(causes),
      foundOn: z.iso.date(),
    }),
  ),
});

export type DigestContent = z.output<typeof digestContent>;
