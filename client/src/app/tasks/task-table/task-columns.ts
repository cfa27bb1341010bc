import type { TableColumn } from '../../ui/data-table/table-column';
import { dayText } from '../due-text/due-text';
import type { Task } from '../tasks-api';

/** The columns of the table; those without `text` have a template of their own. */
export const taskColumns = (
  locale: string,
  text: (both: { readonly en: string; readonly es: string }) => string,
): readonly TableColumn<Task>[] => [
  { key: 'rule', label: $localize`:@@tasks.col.task:Task`, sort: 'rule' },
  { key: 'state', label: $localize`:@@tasks.col.state:State`, phone: 'aside' },
  { key: 'store', label: $localize`:@@tasks.col.store:Store`, sort: 'store' },
  { key: 'due', label: $localize`:@@tasks.col.due:Due`, sort: 'due' },
  { key: 'closes', label: $localize`:@@tasks.col.closes:On time until`, sort: 'closes' },
  { key: 'who', label: $localize`:@@tasks.col.who:Who`, sort: 'technician' },
  {
    key: 'visit',
    label: $localize`:@@tasks.col.visit:On a route`,
    choice: 'on',
    text: (task) => task.visitOn && dayText(task.visitOn, locale),
  },
  {
    key: 'procedure',
    label: $localize`:@@tasks.col.procedure:Procedure`,
    choice: 'off',
    phone: 'none',
    text: (task) => text(task.procedureTitle),
  },
  {
    key: 'deferred',
    label: $localize`:@@tasks.col.deferred:Deferred from`,
    choice: 'off',
    phone: 'none',
    text: (task) => task.deferredFrom && dayText(task.deferredFrom, locale),
  },
  {
    key: 'note',
    label: $localize`:@@tasks.col.note:Reason given`,
    choice: 'off',
    phone: 'none',
    text: (task) => task.outcomeReason,
  },
];
