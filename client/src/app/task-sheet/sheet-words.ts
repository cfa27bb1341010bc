import type { couldNotReasons } from '@shared/inspections/inspections-contract';
import type { NumberLimit } from '@shared/procedures/procedure-content';
import type { Limit } from '@shared/procedures/within-limit';
import type { TaskEvent } from './task-sheet-api';

export type CouldNotReason = (typeof couldNotReasons)[number];

export const reasons: readonly CouldNotReason[] = [
  'no-access',
  'in-use',
  'unit-off',
  'part-missing',
  'tool-missing',
  'unsafe',
  'other',
];

export function reasonWord(reason: string): string {
  switch (reason as CouldNotReason) {
    case 'no-access':
      return $localize`:@@task-sheet.reason.no-access:Could not get to it`;
    case 'in-use':
      return $localize`:@@task-sheet.reason.in-use:In use, could not be stopped`;
    case 'unit-off':
      return $localize`:@@task-sheet.reason.unit-off:The unit is out of service`;
    case 'part-missing':
      return $localize`:@@task-sheet.reason.part-missing:A part was missing`;
    case 'tool-missing':
      return $localize`:@@task-sheet.reason.tool-missing:A tool was missing`;
    case 'unsafe':
      return $localize`:@@task-sheet.reason.unsafe:Not safe to do`;
    case 'other':
      return $localize`:@@task-sheet.reason.other:Another reason`;
    default:
      return reason;
  }
}

/** A kept reason, `no-access: Line blocked`, in words. */
export function keptReason(text: string): string {
  const [reason = '', ...note] = text.split(': ');
  const word = reasonWord(reason);
  return note.length > 0 ? `${word}: ${note.join(': ')}` : word;
}

export function eventWord({ action }: TaskEvent): string {
  switch (action) {
    case 'done':
      return $localize`:@@task-sheet.event.done:Done`;
    case 'acknowledged':
      return $localize`:@@task-sheet.event.acknowledged:Acknowledged`;
    case 'undone':
      return $localize`:@@task-sheet.event.undone:Taken back`;
    case 'could-not':
      return $localize`:@@task-sheet.event.could-not:Could not be done`;
    case 'excused':
      return $localize`:@@task-sheet.event.excused:Excused`;
    case 'deferred':
      return $localize`:@@task-sheet.event.deferred:Deferred`;
    case 'assigned':
      return $localize`:@@task-sheet.event.assigned:Assigned`;
    case 'reopened':
      return $localize`:@@task-sheet.event.reopened:Opened again`;
    default:
      return $localize`:@@task-sheet.event.changed:Changed`;
  }
}

/** The limit of a number on this unit: "103.5 to 126.5 V". Empty where there is none. */
export function limitText(
  limit: Limit | undefined,
  unit: string,
  format: Intl.NumberFormat,
): string {
  if (!limit) return '';
  const [low, high] = [limit.low, limit.high].map((end) =>
    end === null ? '' : format.format(end),
  );
  if (low && high)
    return $localize`:@@task-sheet.limit.both:${low}:low: to ${high}:high: ${unit}:unit:`;
  if (high) return $localize`:@@task-sheet.limit.high:at most ${high}:high: ${unit}:unit:`;
  return low ? $localize`:@@task-sheet.limit.low:at least ${low}:low: ${unit}:unit:` : '';
}

/** Why a number has no limit to be held against, where one was meant. */
export function missingLimit(number: NumberLimit, limit: Limit | undefined): string {
  return number.limitFrom && !limit
    ? $localize`:@@task-sheet.limit.unknown:The motor’s nameplate is not on record: note what it says.`
    : '';
}
