import type { ValidationErrors } from '@angular/forms';

/** The words for what is wrong with one control; the first fault only, as the rest often follow. */
export function controlWords(errors: ValidationErrors | null): string {
  if (!errors) return '';
  if (typeof errors['server'] === 'string') return errors['server'];
  if (typeof errors['words'] === 'string') return errors['words'];
  if (errors['required'] ?? errors['requiredTrue']) {
    return $localize`:@@ui.field.required:This is needed.`;
  }
  if (errors['email']) {
    return $localize`:@@ui.field.email:Give an e-mail address, such as name@example.com.`;
  }
  const { minlength, maxlength, min, max } = errors as {
    minlength?: { requiredLength: number };
    maxlength?: { requiredLength: number };
    min?: { min: number };
    max?: { max: number };
  };
  if (minlength) {
    return $localize`:@@ui.field.min-length:Use at least ${minlength.requiredLength}:count: characters.`;
  }
  if (maxlength) {
    return $localize`:@@ui.field.max-length:Use at most ${maxlength.requiredLength}:count: characters.`;
  }
  if (min) return $localize`:@@ui.field.min:This must be ${min.min}:limit: or more.`;
  if (max) return $localize`:@@ui.field.max:This must be ${max.max}:limit: or less.`;
  return $localize`:@@ui.field.other:This is not in the form expected.`;
}
