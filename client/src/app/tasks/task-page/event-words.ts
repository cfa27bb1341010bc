/** What somebody did with a task, by the name under which the server keeps it. */
export function eventWords(action: string): string {
  switch (action) {
    case 'assigned':
      return $localize`:@@tasks.event.assigned:assigned`;
    case 'change-taken-back':
      return $localize`:@@tasks.event.taken-back:change taken back`;
    case 'excused':
      return $localize`:@@tasks.event.excused:excused`;
    case 'deferred':
      return $localize`:@@tasks.event.deferred:deferred`;
    case 'done':
      return $localize`:@@tasks.event.done:done`;
    case 'acknowledged':
      return $localize`:@@tasks.event.acknowledged:acknowledged`;
    case 'undone':
      return $localize`:@@tasks.event.undone:taken back`;
    case 'could-not':
      return $localize`:@@tasks.event.could-not:could not be done`;
    default:
      return action;
  }
}
