import type { VersionChange } from '@shared/procedures/compare-versions';
import type { NumberLimit } from '@shared/procedures/procedure-content';
import type { Language } from '../../session/language-choice';
import { limitWords } from '../procedure-words';

export function changeWord(kind: VersionChange['kind']): string {
  switch (kind) {
    case 'added':
      return $localize`:@@procedures.change.added:added`;
    case 'removed':
      return $localize`:@@procedures.change.removed:removed`;
    case 'changed':
      return $localize`:@@procedures.change.changed:changed`;
    case 'moved':
      return $localize`:@@procedures.change.moved:moved`;
  }
}

/** The name of a part or a step's field; unknown ones by their own name. */
export function fieldWord(field: string): string {
  const words: Readonly<Record<string, string>> = {
    title: $localize`:@@procedures.field.title:Title`,
    purpose: $localize`:@@procedures.field.purpose:Purpose`,
    minutes: $localize`:@@procedures.minutes:Minutes`,
    tools: $localize`:@@procedures.tools:Tools`,
    parts: $localize`:@@procedures.parts:Parts`,
    cautions: $localize`:@@procedures.field.cautions:Cautions`,
    steps: $localize`:@@procedures.field.steps:Steps`,
    kind: $localize`:@@procedures.field.kind:Kind`,
    text: $localize`:@@procedures.field.text:Text`,
    help: $localize`:@@procedures.field.help:Help`,
    caution: $localize`:@@procedures.field.caution:Caution`,
    required: $localize`:@@procedures.field.required:Must be answered`,
    component: $localize`:@@procedures.field.component:Component`,
    cause: $localize`:@@procedures.field.cause:Usual cause`,
    severity: $localize`:@@procedures.field.severity:Severity`,
    number: $localize`:@@procedures.field.number:Limit`,
    choices: $localize`:@@procedures.field.choices:Answers`,
  };
  return words[field] ?? field;
}

/** A value of a version as a person reads it: both languages of a text, one line per answer. */
export function valueWords(value: unknown, language: Language): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'boolean') {
    return value ? $localize`:@@procedures.yes:yes` : $localize`:@@procedures.no:no`;
  }
  if (typeof value !== 'object') return String(value);
  if (Array.isArray(value)) return value.map((it) => valueWords(it, language)).join('\n');
  const it = value as Readonly<Record<string, unknown>>;
  if (typeof it['en'] === 'string' && typeof it['es'] === 'string') {
    return `${it['en']}\n${it['es']}`;
  }
  if (typeof it['unit'] === 'string') {
    const basis = valueWords(it['basis'], language);
    return [limitWords(value as NumberLimit), basis].filter(Boolean).join('\n');
  }
  return valueWords(it['text'], language);
}
