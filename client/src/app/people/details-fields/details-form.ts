import { FormControl, FormGroup, Validators } from '@angular/forms';
import { isTimeZone } from '../../sign-in/account/time-zones';
import type { Person, PersonDetails } from '../people-api';

/** A form that holds these fields, alone or among others. */
export type DetailsForm = FormGroup & { readonly controls: DetailsControls };
type DetailsControls = ReturnType<typeof detailsForm>['controls'];

/** Names of the fields by their paths. */
export function detailsLabels() {
  return {
    name: $localize`:@@people.name:Name`,
    locale: $localize`:@@people.language:Language of letters`,
    timeZone: $localize`:@@people.time-zone:Time zone`,
    homePostalCode: $localize`:@@people.home:Home ZIP code`,
  };
}

/** What is known of a person apart from their roles. */
export function detailsForm(
  person: Partial<Pick<Person, 'name' | 'locale' | 'timeZone' | 'homePostalCode'>>,
) {
  return new FormGroup({
    name: new FormControl(person.name ?? '', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(120)],
    }),
    locale: new FormControl<'en' | 'es'>(person.locale ?? 'en', { nonNullable: true }),
    timeZone: new FormControl(person.timeZone ?? '', {
      nonNullable: true,
      validators: [
        Validators.required,
        (control) =>
          isTimeZone(String(control.value))
            ? null
            : { words: $localize`:@@people.zone-unknown:Choose a zone from the list.` },
      ],
    }),
    homePostalCode: new FormControl(person.homePostalCode ?? '', {
      nonNullable: true,
      validators: (control) =>
        /^(\d{5}(-?\d{4})?)?$/.test(String(control.value).trim())
          ? null
          : { words: $localize`:@@people.zip-form:Give a ZIP code of five digits.` },
    }),
  });
}

export function detailsOf({ controls }: { readonly controls: DetailsControls }): PersonDetails {
  const { name, locale, timeZone, homePostalCode } = controls;
  return {
    name: name.value.trim(),
    locale: locale.value,
    timeZone: timeZone.value,
    homePostalCode: homePostalCode.value.trim() || null,
  };
}
