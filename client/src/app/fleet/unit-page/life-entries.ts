import { componentKindWords } from '@shared/fleet/fleet-words';
import type { Language } from '../../session/language-choice';
import type { LifeEntry } from '../../ui/life-line/life-line';
import { causeWord, severityWord } from '../fleet-words';
import type { LifeEvent } from '../unit-api';

/** A unit's events as marks of its life line, each in a line of words. */
export function lifeEntries(
  events: readonly LifeEvent[],
  language: Language,
): readonly LifeEntry[] {
  return events.map((event) => ({
    id: event.id,
    kind: event.kind,
    at: Date.parse(event.at),
    what: wordsOf(event, language),
    who: event.person ?? '',
    ...(event.findingId && { link: ['/findings', event.findingId] }),
  }));
}

function wordsOf(event: LifeEvent, language: Language): string {
  const part = event.componentKind ? componentKindWords[event.componentKind][language] : '';
  const own = event.what?.[language] ?? event.what?.en ?? '';
  const said = [
    part,
    own,
    causeWord(event.cause, language),
    severityWord(event.severity, language),
  ];
  const words = said.filter(Boolean).join(' · ');
  const whole = event.id === 'unit' ? $localize`:@@fleet.life.unit:the unit itself` : words;
  return event.note ? `${whole}${whole ? ': ' : ''}${event.note}` : whole;
}

/** The ends of the axis: from the first event to now, at least half a year, with a little room. */
export function lifeSpan(
  entries: readonly Pick<LifeEntry, 'at'>[],
  now: number,
): { readonly from: number; readonly to: number } {
  const halfYear = 183 * 86_400_000;
  const first = Math.min(now - halfYear, ...entries.map(({ at }) => at));
  const last = Math.max(now, ...entries.map(({ at }) => at));
  const room = (last - first) * 0.01;
  return { from: first - room, to: last + room };
}
