import { FormControl, Validators } from '@angular/forms';
import { passwordLength } from '@shared/sign-in/password-length';

/** A control for a password being chosen: long enough, otherwise as the person likes. */
export function newPasswordControl(): FormControl<string> {
  return new FormControl('', {
    nonNullable: true,
    validators: [
      Validators.required,
      Validators.minLength(passwordLength.min),
      Validators.maxLength(passwordLength.max),
    ],
  });
}

/** What to say beside it. */
export const newPasswordHint = $localize`:@@sign-in.password-hint:At least ${passwordLength.min}:count: characters. Several unrelated words work well.`;
