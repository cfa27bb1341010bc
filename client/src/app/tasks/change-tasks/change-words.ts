import type { TaskChange } from '../tasks-api';

type LeftReason = NonNullable<TaskChange['results'][number]['left']>;

/** What was done to so many tasks. */
export function changedWords(kind: TaskChange['kind'], count: number): string {
  switch (kind) {
    case 'assign':
      return count === 1
        ? $localize`:@@tasks.changed.assign-one:1 task assigned.`
        : $localize`:@@tasks.changed.assign:${count}:count: tasks assigned.`;
    case 'excuse':
      return count === 1
        ? $localize`:@@tasks.changed.excuse-one:1 task excused.`
        : $localize`:@@tasks.changed.excuse:${count}:count: tasks excused.`;
    case 'defer':
      return count === 1
        ? $localize`:@@tasks.changed.defer-one:1 task deferred.`
        : $localize`:@@tasks.changed.defer:${count}:count: tasks deferred.`;
  }
}

/** Why a task was left as it was. */
export function leftWords(reason: LeftReason): string {
  switch (reason) {
    case 'not-found':
      return $localize`:@@tasks.left.not-found:it is gone, or not yours to see`;
    case 'not-allowed':
      return $localize`:@@tasks.left.not-allowed:your role does not reach this store`;
    case 'changed-meanwhile':
      return $localize`:@@tasks.left.changed-meanwhile:someone changed it meanwhile`;
    case 'already-so':
      return $localize`:@@tasks.left.already-so:it was so already`;
    case 'decided':
      return $localize`:@@tasks.left.decided:it is done, excused or covered`;
    case 'lapsed':
      return $localize`:@@tasks.left.lapsed:it can no longer be done, not even late`;
    case 'for-the-store':
      return $localize`:@@tasks.left.for-the-store:it is for store staff`;
    case 'not-their-store':
      return $localize`:@@tasks.left.not-their-store:the technician does not work at this store`;
    case 'on-published-route':
      return $localize`:@@tasks.left.on-published-route:it is on a published route: move the visit instead`;
    case 'window-closed':
      return $localize`:@@tasks.left.window-closed:its window has closed`;
    case 'belongs-to-shift':
      return $localize`:@@tasks.left.belongs-to-shift:a check of a shift belongs to its hours`;
    case 'not-later':
      return $localize`:@@tasks.left.not-later:it is due on that day or after it already`;
    case 'too-far':
      return $localize`:@@tasks.left.too-far:that is more than ninety days after it was first due`;
  }
}
