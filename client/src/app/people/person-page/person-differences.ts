import type { FieldDifference } from '../../fleet/edit-conflict/edit-conflict';
import { differencesOf } from '../../fleet/edit-conflict/edit-conflict';
import { detailsLabels } from '../details-fields/details-form';
import type { Person, PersonDetails } from '../people-api';

/** Where a person as somebody else saved them differs from what is being sent. */
export function differencesOfPerson(
  theirs: Person,
  mine: PersonDetails,
): readonly FieldDifference[] {
  const { name, locale, timeZone, homePostalCode } = theirs;
  return differencesOf({ name, locale, timeZone, homePostalCode }, mine, detailsLabels());
}
