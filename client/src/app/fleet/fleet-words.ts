import { type Cause, causeWords, severityWords, type Severity } from '@shared/findings/cause';
import { removalReasonWords, type RemovalReason } from '@shared/fleet/fleet-words';
import type { Nameplate } from '@shared/fleet/nameplate';
import type { IconName } from '../ui/icon/icon-paths';
import type { Language } from '../session/language-choice';
import type { GroupKind, StoreRow } from './fleet-api';
import type { Part } from './unit-api';

export const partIcons: Readonly<Record<Part['kind'], IconName>> = {
  pump: 'pump',
  motor: 'motor',
  pan: 'drop',
  hose: 'route',
};

/** The choices of a list between what is in use and what is retired. */
export function standingOptions() {
  return [
    { value: 'retired', label: $localize`:@@fleet.state.retired:Retired` },
    { value: 'all', label: $localize`:@@fleet.state.all:All, retired too` },
  ];
}

export const inUseWord = (): string => $localize`:@@fleet.state.live:In use`;

export function groupsWord(kind: GroupKind): string {
  return kind === 'chains'
    ? $localize`:@@fleet.chains:Chains`
    : $localize`:@@fleet.regions:Regions`;
}

/** Number and name of a store, as they stand together everywhere. */
export function storeTitle({ number, name }: Pick<StoreRow, 'number' | 'name'>): string {
  return `${number} ${name}`;
}

/** The word for a cause as stored with a part that came off, or with a finding. */
export function causeWord(cause: string | null, language: Language): string {
  if (!cause) return '';
  return (
    causeWords[cause as Cause]?.[language] ??
    removalReasonWords[cause as RemovalReason]?.[language] ??
    cause
  );
}

export function severityWord(severity: string | null, language: Language): string {
  return severity ? (severityWords[severity as Severity]?.[language] ?? severity) : '';
}

/** A nameplate on one line, such as "115 V · 6.8 A · 1/2 hp". Empty when nothing is known. */
export function nameplateWords(plate: Nameplate, locale: string): string {
  const figure = (value: number) => new Intl.NumberFormat(locale).format(value);
  return [
    plate.volts !== undefined && `${figure(plate.volts)} V`,
    plate.amps !== undefined && `${figure(plate.amps)} A`,
    plate.horsepower !== undefined && `${figure(plate.horsepower)} hp`,
    plate.phase !== undefined &&
      (plate.phase === 1
        ? $localize`:@@fleet.plate.single-phase:single-phase`
        : $localize`:@@fleet.plate.three-phase:three-phase`),
    plate.rpm !== undefined && $localize`:@@fleet.plate.rpm:${figure(plate.rpm)}:rpm: rpm`,
  ]
    .filter(Boolean)
    .join(' · ');
}
