import type { Block, ListLine } from '@shared/mail/block';
import type { Locale } from '@shared/mail/locale';
import { formatMoment } from '@shared/mail/format-moment';
import type { MailMessage, WrittenMessage } from '../mail-message';

/** One task to tell about. Times in epoch milliseconds. */
export interface RemindedTask {
  readonly taskId: string;
  readonly kind: 'due-soon' | 'overdue' | 'missed';
  readonly title: string;
  readonly store: string;
  readonly unitTag: string | null;
  readonly closesAt: number;
}

export interface RemindersContent {
  readonly name: string;
  readonly timeZone: string;
  readonly baseUrl: string;
  /** In the order in which they are to be read. */
  readonly tasks: readonly RemindedTask[];
}

/** A letter names so many tasks of a kind and counts the rest: past that, the list is for the page. */
const MOST_NAMED = 40;

const kinds = ['overdue', 'due-soon', 'missed'] as const;

const words = {
  en: {
    greeting: (name: string) => `Good morning ${name},`,
    subject: {
      overdue: (n: number) => `${n} overdue`,
      'due-soon': (n: number) => `${n} due soon`,
      missed: (n: number) => `${n} missed`,
    },
    preview: (count: number, stores: number) =>
      `${count === 1 ? '1 task' : `${count} tasks`} in ${stores === 1 ? '1 store' : `${stores} stores`}`,
    heading: {
      overdue: 'Overdue: can still be done, late',
      'due-soon': 'Due soon',
      missed: 'Missed: can no longer be done',
    },
    when: {
      overdue: (moment: string) => `window closed ${moment}`,
      'due-soon': (moment: string) => `until ${moment}`,
      missed: (moment: string) => `window closed ${moment}`,
    },
    more: (n: number) => `and ${n} more`,
    button: 'Open the list',
    note: 'Each task is told once when it comes due and once when its window has closed. Follow the cautions of each procedure; local codes and licensed practice decide.',
  },
  es: {
    greeting: (name: string) => `Buenos días, ${name}:`,
    subject: {
      overdue: (n: number) => (n === 1 ? '1 vencida' : `${n} vencidas`),
      'due-soon': (n: number) => (n === 1 ? '1 vence pronto' : `${n} vencen pronto`),
      missed: (n: number) => (n === 1 ? '1 no hecha' : `${n} no hechas`),
    },
    preview: (count: number, stores: number) =>
      `${count === 1 ? '1 tarea' : `${count} tareas`} en ${stores === 1 ? '1 tienda' : `${stores} tiendas`}`,
    heading: {
      overdue: 'Vencidas: todavía se pueden hacer, con retraso',
      'due-soon': 'Vencen pronto',
      missed: 'No hechas: ya no se pueden hacer',
    },
    when: {
      overdue: (moment: string) => `la ventana cerró el ${moment}`,
      'due-soon': (moment: string) => `hasta el ${moment}`,
      missed: (moment: string) => `la ventana cerró el ${moment}`,
    },
    more: (n: number) => `y ${n} más`,
    button: 'Abrir la lista',
    note: 'De cada tarea se avisa una vez cuando vence pronto y otra cuando cerró su ventana. Siga las precauciones de cada procedimiento; deciden las normas locales y la práctica con licencia.',
  },
} as const;

/** One message a day with what is due soon, overdue or missed and concerns its reader. */
export const remindersMessage: MailMessage<RemindersContent> = {
  kind: 'reminders',
  sample: {
    name: 'Rosa',
    timeZone: 'America/Chicago',
    baseUrl: 'https://vatwright.example',
    tasks: [
      {
        taskId: '6f0c7b7e-2f0a-4f5e-9d52-3f6d7b1c2a90',
        kind: 'overdue',
        title: 'Pump seal check at the drain slot',
        store: '0142 Union Depot',
        unitTag: 'F-2',
        closesAt: Date.UTC(2026, 5, 10, 5),
      },
      {
        taskId: '0d3f9d38-54c9-4b3e-8f0f-92f6a7a4b1de',
        kind: 'due-soon',
        title: 'Motor current and overload check',
        store: '0142 Union Depot',
        unitTag: 'F-1',
        closesAt: Date.UTC(2026, 5, 13, 5),
      },
    ],
  },
  write(content, locale) {
    const its = words[locale];
    const present = kinds.filter((kind) => content.tasks.some((task) => task.kind === kind));
    const counted = present.map((kind) =>
      its.subject[kind](content.tasks.filter((task) => task.kind === kind).length),
    );
    const stores = new Set(content.tasks.map(({ store }) => store)).size;
    return {
      subject: `Vatwright: ${counted.join(', ')}`,
      preview: its.preview(content.tasks.length, stores),
      blocks: [
        { kind: 'paragraph', text: its.greeting(content.name) },
        ...present.flatMap((kind) => section(content, kind, locale)),
        { kind: 'button', label: its.button, href: `${content.baseUrl}/` },
        { kind: 'note', text: its.note },
      ],
    } satisfies WrittenMessage;
  },
};

function section(content: RemindersContent, kind: RemindedTask['kind'], locale: Locale): Block[] {
  const its = words[locale];
  const all = content.tasks.filter((task) => task.kind === kind);
  const byStore = new Map<string, ListLine[]>();
  for (const task of all.slice(0, MOST_NAMED)) {
    // The window's end is the first moment outside it; people are told the last one inside.
    const last = formatMoment(task.closesAt - 60_000, content.timeZone, locale);
    const unit = task.unitTag ? ` (${task.unitTag})` : '';
    const line = {
      text: `${task.title}${unit}, ${its.when[kind](last)}`,
      href: `${content.baseUrl}/tasks/${task.taskId}`,
    };
    byStore.set(task.store, [...(byStore.get(task.store) ?? []), line]);
  }
  return [
    { kind: 'heading', text: its.heading[kind] },
    ...[...byStore].map(([title, lines]) => ({ kind: 'list' as const, title, lines })),
    ...(all.length > MOST_NAMED
      ? [{ kind: 'paragraph' as const, text: its.more(all.length - MOST_NAMED) }]
      : []),
  ];
}
