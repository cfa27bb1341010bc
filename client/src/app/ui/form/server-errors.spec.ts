import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import { placeServerErrors } from './server-errors';

describe('placeServerErrors', () => {
  const form = new FormGroup({
    name: new FormControl('Mill Pond', Validators.required),
    vats: new FormArray([new FormGroup({ litres: new FormControl(0) })]),
  });

  it('finds nested controls and returns the faults that have none', () => {
    const left = placeServerErrors(form, [
      { field: 'name', words: 'Taken.' },
      { field: 'vats.0.litres', words: 'Too small.' },
      { field: 'chainId', words: 'No such chain.' },
      { field: '', words: 'Not now.' },
    ]);
    expect(left.map((error) => error.words)).toEqual(['No such chain.', 'Not now.']);
    expect(form.get('name')?.errors).toEqual({ server: 'Taken.' });
    expect(form.get('vats.0.litres')?.touched).toBe(true);
  });

  it('lets the fault go when the value changes', () => {
    form.controls.name.setValue('Mill Pond 2');
    expect(form.controls.name.errors).toBeNull();
  });
});
