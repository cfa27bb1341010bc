import type { TaskState } from '@shared/tasks/task-state';

/** The word for a task's state, as it stands beside its glyph. */
export function stateWord(state: TaskState): string {
  switch (state) {
    case 'planned':
      return $localize`:@@ui.state.planned:planned`;
    case 'open':
      return $localize`:@@ui.state.open:open`;
    case 'due-soon':
      return $localize`:@@ui.state.due-soon:due soon`;
    case 'overdue':
      return $localize`:@@ui.state.overdue:overdue`;
    case 'done':
      return $localize`:@@ui.state.done:done`;
    case 'done-late':
      return $localize`:@@ui.state.done-late:done late`;
    case 'missed':
      return $localize`:@@ui.state.missed:missed`;
    case 'excused':
      return $localize`:@@ui.state.excused:excused`;
    case 'covered':
      return $localize`:@@ui.state.covered:covered`;
  }
}

/** Every state in the order of a legend. */
export const taskStates: readonly TaskState[] = [
  'planned',
  'open',
  'due-soon',
  'overdue',
  'done',
  'done-late',
  'missed',
  'excused',
  'covered',
];
