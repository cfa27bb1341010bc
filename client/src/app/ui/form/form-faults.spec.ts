import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import { fieldId, formFaults } from './form-faults';

describe('formFaults', () => {
  it('lists every fault in order, nested ones by path', () => {
    const form = new FormGroup({
      name: new FormControl('', Validators.required),
      code: new FormControl('ok'),
      steps: new FormArray([
        new FormControl('a'),
        new FormControl('ab', { validators: Validators.minLength(3) }),
      ]),
    });
    expect(formFaults(form)).toEqual([
      { path: 'name', words: 'This is needed.' },
      { path: 'steps.1', words: 'Use at least 3 characters.' },
    ]);
  });

  it('gives a path without dots as id', () => {
    expect(fieldId('steps.1')).toBe('field-steps-1');
  });
});
