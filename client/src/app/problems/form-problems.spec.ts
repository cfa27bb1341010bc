import { FormControl, FormGroup } from '@angular/forms';
import { showInForm } from './form-problems';
import { Problem } from './problem';

const form = () => new FormGroup({ email: new FormControl('') });

describe('showInForm', () => {
  it('puts known reasons in our words at the field', () => {
    const target = form();
    const general = showInForm(
      target,
      new Problem(422, 'validation-failed', '', '', '', [
        { field: 'email', reason: 'taken', message: 'dup' },
        { field: 'scope', reason: 'odd', message: 'The scope is odd.' },
      ]),
    );
    expect(target.controls.email.errors).toEqual({ server: 'This is taken already.' });
    expect(general).toEqual(['The scope is odd.']);
  });

  it('says the problem itself where no field is at fault', () => {
    expect(showInForm(form(), new Problem(0, 'offline'))[0]).toContain('No connection');
  });

  it('gives the request number of a fault on the server', () => {
    expect(showInForm(form(), new Problem(500, 'x', '', '', 'r-9'))[0]).toContain('(r-9)');
  });
});
