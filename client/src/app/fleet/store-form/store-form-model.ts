import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { AbstractControl, ValidationErrors, ValidatorFn } from '@angular/forms';
import type { DayHours, StoreHours, WeekdayCode } from '@shared/fleet/store-hours';
import type { Store, StoreBody } from '../fleet-api';
import { weekdays } from '../store-hours/hours-words';

const control = <T>(value: T) => new FormControl(value, { nonNullable: true });
const line = (value: string, max: number, required = false) =>
  new FormControl(value, {
    nonNullable: true,
    validators: [Validators.maxLength(max), ...(required ? [Validators.required] : [])],
  });

/** How a weekday stands to the usual day. */
export type DayMode = 'usual' | 'own' | 'closed';

export function rushForm(rush: { from: string; to: string } = { from: '', to: '' }) {
  const time = (value: string) =>
    new FormControl(value, { nonNullable: true, validators: [Validators.required] });
  return new FormGroup({ from: time(rush.from), to: time(rush.to) }, { validators: [endsAfter] });
}

/** The fault stands at the end of the rush, where it is mended. */
function endsAfter(group: AbstractControl): ValidationErrors | null {
  const { from, to } = group.value as { from: string; to: string };
  return from && to && to <= from
    ? { words: $localize`:@@fleet.fault.rush:The rush must end after it begins.` }
    : null;
}

function dayForm(day: DayHours) {
  return {
    open: control(day.open ?? ''),
    close: control(day.close ?? ''),
    rush: new FormArray(day.rush.map((rush) => rushForm(rush))),
  };
}

function weekdayForm(own: DayHours | null | undefined) {
  const mode: DayMode = own === undefined ? 'usual' : own === null ? 'closed' : 'own';
  return new FormGroup({ mode: control(mode), ...dayForm(own ?? noHours) });
}

const noHours: DayHours = { open: null, close: null, rush: [] };

export function hoursForm(hours: StoreHours) {
  const byDay = Object.fromEntries(
    weekdays.map((day) => [day, weekdayForm(hours.byDay?.[day])]),
  ) as Record<WeekdayCode, ReturnType<typeof weekdayForm>>;
  return new FormGroup({ ...dayForm(hours), byDay: new FormGroup(byDay) });
}

export type HoursForm = ReturnType<typeof hoursForm>;
export type WeekdayForm = ReturnType<typeof weekdayForm>;
export type RushForm = ReturnType<typeof rushForm>;

/** A position that is not to be given cannot be wrong. */
function whenGiven(...validators: ValidatorFn[]): ValidatorFn {
  const all = Validators.compose(validators);
  return (degrees) =>
    degrees.parent?.parent?.get('positionGiven')?.value ? (all?.(degrees) ?? null) : null;
}

/** Controls stand at the paths of the contract, so that the server's faults find them. */
export function storeForm(store?: Partial<Store>) {
  const own = store?.positionFrom === 'coordinates';
  const degrees = (value: number | undefined, limit: number) =>
    new FormControl<number | null>(
      own ? (value ?? null) : null,
      whenGiven(Validators.required, Validators.min(-limit), Validators.max(limit)),
    );
  const zone = store?.timeZone === store?.timeZoneOfPosition ? '' : (store?.timeZone ?? '');
  return new FormGroup({
    chainId: line(store?.chainId ?? '', 36, true),
    regionId: line(store?.regionId ?? '', 36, true),
    number: line(store?.number ?? '', 40, true),
    name: line(store?.name ?? '', 120, true),
    addressLine: line(store?.addressLine ?? '', 200),
    postalCode: line(store?.postalCode ?? '', 20),
    city: line(store?.city ?? '', 100),
    usState: line(store?.usState ?? '', 40),
    phone: line(store?.phone ?? '', 40),
    accessNote: line(store?.accessNote ?? '', 1000),
    positionGiven: control(own),
    position: new FormGroup({
      latitude: degrees(store?.latitude, 90),
      longitude: degrees(store?.longitude, 180),
    }),
    /** Empty: the zone in which the position lies. */
    timeZone: control(zone),
    hours: hoursForm(store?.hours ?? noHours),
  });
}

export type StoreForm = ReturnType<typeof storeForm>;

/** What the form says, as the server takes it. */
export function storeBody(form: StoreForm): StoreBody {
  const { positionGiven, position, timeZone, hours, ...rest } = form.getRawValue();
  const { latitude, longitude } = position;
  const given = positionGiven && latitude !== null && longitude !== null;
  return {
    ...rest,
    position: given ? { latitude, longitude } : null,
    timeZone: timeZone || null,
    hours: hoursBody(hours),
  };
}

/** A store as the form would send it unchanged; for setting theirs beside mine. */
export const bodyOfStore = (store: Store): StoreBody => storeBody(storeForm(store));

type RawHours = ReturnType<HoursForm['getRawValue']>;
type RawDay = Pick<RawHours, 'open' | 'close' | 'rush'>;

function hoursBody({ byDay, ...usual }: RawHours): StoreHours {
  const differing = weekdays.flatMap((day) => {
    const { mode, ...own } = byDay[day];
    return mode === 'usual' ? [] : [[day, mode === 'closed' ? null : dayBody(own)] as const];
  });
  return {
    ...dayBody(usual),
    ...(differing.length > 0 && { byDay: Object.fromEntries(differing) }),
  };
}

function dayBody({ open, close, rush }: RawDay): DayHours {
  return { open: open || null, close: close || null, rush };
}
