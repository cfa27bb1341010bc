import { NEVER_LAPSES, type WindowPlan } from '../recurrence/window';

/** What is known of a task when somebody asks why it is there. Instants in epoch milliseconds. */
export interface WhyFacts {
  readonly ruleName: string;
  readonly programmeName: string;
  /** The recurrence in words, in the language of the sentences. */
  readonly recurrence: string;
  /** The unit and its store, or the store alone. */
  readonly place: string;
  /** The store's zone, in which all times are told. */
  readonly timeZone: string;
  readonly scheduleFrom: string;
  readonly occursLocal: string;
  readonly window: WindowPlan;
  readonly opensAt: number;
  readonly closesAt: number;
  readonly lapsesAt: number;
  readonly revision: number;
  readonly currentRevision: number;
  readonly deferredFrom: string | null;
  readonly dueOn: string;
  /** When the place left the rule, where it did. */
  readonly endedAt: number | null;
}

/**
 * Why a task is there, in sentences from the rule to this very window.
 *
 * @example
 * whySentences(facts, 'en')[0]
 * // 'The rule “Pump seal” of the programme “Filter care” says: Every month on the 2nd Wednesday at 09:00.'
 */
export function whySentences(facts: WhyFacts, language: 'en' | 'es'): string[] {
  const { window } = facts;
  const say = sentences[language];
  const tell = tellers(language, facts.timeZone);
  const all = [
    say.rule(facts.ruleName, facts.programmeName, facts.recurrence),
    say.place(facts.place, tell.day(facts.scheduleFrom)),
    say.occurs(tell.local(facts.occursLocal), facts.timeZone),
  ];
  if (facts.deferredFrom)
    all.push(say.deferred(tell.day(facts.deferredFrom), tell.day(facts.dueOn)));
  const span = window.kind === 'days' ? say.days : say.hours;
  all.push(
    say.window(
      span(window.before),
      span(window.after),
      tell.instant(facts.opensAt),
      tell.instant(facts.closesAt),
    ),
  );
  if (facts.lapsesAt >= NEVER_LAPSES) all.push(say.neverLapses);
  else if (facts.lapsesAt > facts.closesAt) all.push(say.lapses(tell.instant(facts.lapsesAt)));
  else all.push(say.notLate);
  if (facts.revision !== facts.currentRevision) {
    all.push(say.revision(facts.revision, facts.currentRevision));
  }
  if (facts.endedAt !== null) all.push(say.ended(facts.place, tell.instant(facts.endedAt)));
  return all;
}

const count = (one: string, many: string) => (n: number) => `${n} ${n === 1 ? one : many}`;

const sentences = {
  en: {
    rule: (rule: string, programme: string, words: string) =>
      `The rule “${rule}” of the programme “${programme}” says: ${words}`,
    place: (place: string, from: string) => `${place} stands under this rule from ${from} on.`,
    occurs: (when: string, zone: string) =>
      `So it falls on ${when}, by the store’s clock (${zone}).`,
    deferred: (first: string, now: string) =>
      `It was due on ${first} at first and has been put off to ${now}.`,
    window: (before: string, after: string, from: string, to: string) =>
      `The rule allows ${before} before and ${after} after: it is on time from ${from} until ${to}.`,
    lapses: (until: string) => `After that it can still be done late until ${until}.`,
    notLate: 'After that it can no longer be done and counts as missed.',
    neverLapses: 'After that it can still be done late, however late.',
    revision: (own: number, current: number) =>
      `It follows revision ${own} of the rule. The rule is at revision ${current} now; tasks that had opened, were decided or stood on a published route kept theirs.`,
    ended: (place: string, when: string) =>
      `${place} left this rule on ${when}; this task had opened by then or was somebody’s plan, and stays.`,
    days: count('day', 'days'),
    hours: count('hour', 'hours'),
  },
  es: {
    rule: (rule: string, programme: string, words: string) =>
      `La regla «${rule}» del programa «${programme}» dice: ${words}`,
    place: (place: string, from: string) => `${place} está bajo esta regla desde el ${from}.`,
    occurs: (when: string, zone: string) =>
      `Por eso cae el ${when}, según el reloj de la tienda (${zone}).`,
    deferred: (first: string, now: string) =>
      `Al principio vencía el ${first} y se aplazó al ${now}.`,
    window: (before: string, after: string, from: string, to: string) =>
      `La regla permite ${before} antes y ${after} después: está a tiempo desde el ${from} hasta el ${to}.`,
    lapses: (until: string) => `Después aún puede hacerse con retraso hasta el ${until}.`,
    notLate: 'Después ya no puede hacerse y cuenta como no hecha.',
    neverLapses: 'Después aún puede hacerse con retraso, por tarde que sea.',
    revision: (own: number, current: number) =>
      `Sigue la revisión ${own} de la regla. La regla va por la revisión ${current}; las tareas ya abiertas, decididas o en una ruta publicada conservaron la suya.`,
    ended: (place: string, when: string) =>
      `${place} dejó esta regla el ${when}; esta tarea ya estaba abierta o en el plan de alguien, y se queda.`,
    days: count('día', 'días'),
    hours: count('hora', 'horas'),
  },
} as const;

function tellers(language: 'en' | 'es', timeZone: string) {
  const locale = language === 'es' ? 'es-US' : 'en-US';
  const dayStyle = { weekday: 'long', year: 'numeric', month: 'long', day: 'numeric' } as const;
  const timeStyle = { hour: 'numeric', minute: '2-digit' } as const;
  const format = (options: Intl.DateTimeFormatOptions, instant: number) =>
    new Intl.DateTimeFormat(locale, options).format(instant);
  return {
    /** A calendar date. */
    day: (date: string) =>
      format({ ...dayStyle, timeZone: 'UTC' }, Date.parse(`${date}T00:00:00Z`)),
    /** What a wall clock shows, whatever the zone. */
    local: (local: string) =>
      format({ ...dayStyle, ...timeStyle, timeZone: 'UTC' }, Date.parse(`${local}Z`)),
    /** An instant as the store's clock shows it. */
    instant: (instant: number) => format({ ...dayStyle, ...timeStyle, timeZone }, instant),
  };
}
