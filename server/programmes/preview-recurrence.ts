import { localAt } from '@shared/calendar/instant-of';
import type { BodyOf, ReplyOf } from '@shared/contract/endpoint';
import type { previewRecurrence as contract } from '@shared/programmes/programmes-contract';
import { recurrencePreview } from '@shared/programmes/recurrence-preview';
import { invalid } from '@shared/problem';

/**
 * A recurrence in words with its next twelve dates after `now` in the zone asked for, or what is
 * wrong with which part of it.
 * @throws Problem 422 when there is no such time zone.
 */
export function previewRecurrence(
  { recurrence, timeZone }: BodyOf<typeof contract>,
  now: Date,
): ReplyOf<typeof contract> {
  let local;
  try {
    local = localAt(now.getTime(), timeZone);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw invalid([
      { field: 'timeZone', reason: 'unknown', message: 'There is no such time zone.' },
    ]);
  }
  return recurrencePreview(recurrence, local, 12, timeZone);
}
