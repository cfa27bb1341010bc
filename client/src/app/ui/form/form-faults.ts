import type { AbstractControl } from '@angular/forms';
import { FormArray, FormGroup } from '@angular/forms';
import { controlWords } from './control-words';

export interface FormFault {
  /** Path of the control, parts joined by dots. */
  readonly path: string;
  readonly words: string;
}

/** All faults of a form in the order of its controls, each with its words. */
export function formFaults(control: AbstractControl, path = ''): readonly FormFault[] {
  const own = control.errors ? [{ path, words: controlWords(control.errors) }] : [];
  if (!(control instanceof FormGroup || control instanceof FormArray)) return own;
  const inner = Object.entries(control.controls as Record<string, AbstractControl>).flatMap(
    ([name, child]) => formFaults(child, path ? `${path}.${name}` : name),
  );
  return [...own, ...inner];
}

/** The id that the input of a control must carry, so that the summary can lead to it. */
export function fieldId(path: string): string {
  return `field-${path.replaceAll('.', '-')}`;
}
