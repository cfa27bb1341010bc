import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Enrolment, Reach, ScopeKind } from './programmes-api';

export function scopeWord(kind: ScopeKind): string {
  switch (kind) {
    case 'chain':
      return $localize`:@@programmes.scope.chain:Chain`;
    case 'region':
      return $localize`:@@programmes.scope.region:Region`;
    case 'store':
      return $localize`:@@programmes.scope.store:Store`;
    case 'unit':
      return $localize`:@@programmes.scope.unit:Unit`;
  }
}

export function audienceWord(audience: RuleDefinition['audience']): string {
  return audience === 'technician'
    ? $localize`:@@programmes.audience.technician:Technician`
    : $localize`:@@programmes.audience.store:Store`;
}

export function unitKindWord(kind: 'built-in' | 'portable'): string {
  return kind === 'built-in'
    ? $localize`:@@programmes.kind.built-in:Built-in filters`
    : $localize`:@@programmes.kind.portable:Portable filters`;
}

export function pumpFaceWord(face: 'drain-slot' | 'gasket'): string {
  return face === 'drain-slot'
    ? $localize`:@@programmes.face.drain-slot:Pump face with a drain slot`
    : $localize`:@@programmes.face.gasket:Pump face sealed by a gasket`;
}

/** Which places a rule is for: "every unit", "every store", with what narrows it. */
export function placesWords(
  rule: Pick<RuleDefinition, 'appliesTo' | 'unitKind' | 'pumpFace'>,
): string {
  const what =
    rule.appliesTo === 'unit'
      ? $localize`:@@programmes.each-unit:each unit`
      : $localize`:@@programmes.each-store:each store`;
  const filters = [
    rule.unitKind ? unitKindWord(rule.unitKind) : '',
    rule.pumpFace ? pumpFaceWord(rule.pumpFace) : '',
  ].filter(Boolean);
  return [what, ...filters].join(' · ');
}

/** "45 stores, 140 units"; a rule for stores reaches no unit, which goes without saying. */
export function reachWords(
  { stores, units }: Reach,
  appliesTo: RuleDefinition['appliesTo'] = 'unit',
): string {
  const ofStores =
    stores === 1
      ? $localize`:@@programmes.reach.one-store:1 store`
      : $localize`:@@programmes.reach.stores:${stores}:stores: stores`;
  if (appliesTo === 'store') return ofStores;
  const ofUnits =
    units === 1
      ? $localize`:@@programmes.reach.one-unit:1 unit`
      : $localize`:@@programmes.reach.units:${units}:units: units`;
  return $localize`:@@programmes.reach:${ofStores}:stores:, ${ofUnits}:units:`;
}

/** A calendar date or wall-clock time as it stands, whatever the reader's own zone. */
export function wallText(local: string, locale: string, withTime = true): string {
  const instant = new Date(`${local.length === 10 ? `${local}T00:00:00` : local}Z`);
  return new Intl.DateTimeFormat(locale, {
    timeZone: 'UTC',
    weekday: 'short',
    month: 'short',
    day: 'numeric',
    year: 'numeric',
    ...(withTime ? { hour: 'numeric', minute: '2-digit' } : {}),
  }).format(instant);
}

/** From when until when an enrolment stands. */
export function datesWords({ fromOn, untilOn }: Enrolment, locale: string): string {
  const from = wallText(fromOn, locale, false);
  if (untilOn === null) return $localize`:@@programmes.from:from ${from}:from:`;
  const until = wallText(untilOn, locale, false);
  return $localize`:@@programmes.from-until:${from}:from: to ${until}:until:`;
}
