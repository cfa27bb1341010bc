import { FormControl, Validators } from '@angular/forms';

/** Fewest characters of a password; the server holds the same number. */
export const PASSWORD_MIN = 12;

/** A control for a password being chosen: long enough, otherwise as the person likes. */
export function newPasswordControl(): FormControl<string> {
  return new FormControl('', {
    nonNullable: true,
    validators: [
      Validators.required,
      Validators.minLength(PASSWORD_MIN),
      Validators.maxLength(128),
    ],
  });
}

/** What to say beside it. */
export const newPasswordHint = $localize`:@@sign-in.password-hint:At least ${PASSWORD_MIN}:count: characters. Several unrelated words work well.`;
