import type { TaskState } from '@shared/tasks/task-state';
import { type Words, date, instant, text } from '../exports/export-column';
import type { Task } from './present-task';

const states: Readonly<Record<TaskState, Words>> = {
  planned: { en: 'planned', es: 'prevista' },
  open: { en: 'open', es: 'abierta' },
  'due-soon': { en: 'due soon', es: 'vence pronto' },
  overdue: { en: 'overdue', es: 'vencida' },
  done: { en: 'done', es: 'hecha' },
  'done-late': { en: 'done late', es: 'hecha tarde' },
  missed: { en: 'missed', es: 'no hecha' },
  excused: { en: 'excused', es: 'dispensada' },
  covered: { en: 'covered', es: 'cubierta' },
};

/** What a file of tasks shows, in the order of the list on screen. */
export const taskFileColumns = [
  text<Task>({ en: 'Store', es: 'Tienda' }, (task) => task.storeNumber),
  text<Task>({ en: 'Store name', es: 'Nombre de la tienda' }, (task) => task.storeName),
  text<Task>({ en: 'Unit', es: 'Unidad' }, (task) => task.unitTag),
  text<Task>({ en: 'Rule', es: 'Regla' }, (task) => task.ruleName),
  text<Task>({ en: 'Procedure', es: 'Procedimiento' }, (task) => task.procedureTitle),
  text<Task>({ en: 'State', es: 'Estado' }, (task) => states[task.state]),
  text<Task>({ en: 'Due, store’s time', es: 'Vence, hora de la tienda' }, (task) =>
    task.dueLocal.slice(0, 16).replace('T', ' '),
  ),
  text<Task>({ en: 'Time zone', es: 'Zona horaria' }, (task) => task.timeZone),
  date<Task>({ en: 'On time until', es: 'A tiempo hasta' }, (task) => task.closesOn),
  text<Task>({ en: 'Technician', es: 'Técnico' }, (task) => task.assignee?.name),
  date<Task>({ en: 'On the route of', es: 'En la ruta del' }, (task) => task.visitOn),
  instant<Task>({ en: 'Decided', es: 'Decidida' }, (task) => task.outcomeAt),
  text<Task>({ en: 'Decided by', es: 'Decidida por' }, (task) => task.outcomeBy),
  text<Task>({ en: 'Reason', es: 'Motivo' }, (task) => task.outcomeReason),
  date<Task>({ en: 'Put off from', es: 'Aplazada desde' }, (task) => task.deferredFrom),
];
