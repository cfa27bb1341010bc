import type { AbstractControl } from '@angular/forms';

/** A fault that the server found, with the path of its field and our words for it. */
export interface ServerError {
  readonly field: string;
  readonly words: string;
}

/**
 * Puts each fault on its control, where it stays until the value changes. Returns those whose
 * field this form does not have, for the summary.
 */
export function placeServerErrors(
  form: AbstractControl,
  errors: readonly ServerError[],
): readonly ServerError[] {
  return errors.filter(({ field, words }) => {
    const control = field === '' ? null : form.get(field);
    if (!control) return true;
    control.setErrors({ ...control.errors, server: words });
    control.markAsTouched();
    return false;
  });
}
