import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import type { FormControl } from '@angular/forms';
import { ReactiveFormsModule } from '@angular/forms';
import { MatIconButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FieldError } from '../../ui/form/field-error';
import { Icon } from '../../ui/icon/icon';

/** A password that can be shown, pasted and filled in by a password manager. */
@Component({
  selector: 'vw-password-field',
  imports: [
    FieldError,
    Icon,
    MatError,
    MatFormField,
    MatHint,
    MatIconButton,
    MatInput,
    MatLabel,
    MatSuffix,
    ReactiveFormsModule,
  ],
  templateUrl: './password-field.html',
  styles: `
    :host,
    mat-form-field {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordField {
  readonly control = input.required<FormControl<string>>();
  readonly label = input.required<string>();
  readonly fieldId = input.required<string>();
  readonly autocomplete = input.required<'current-password' | 'new-password'>();
  readonly hint = input('');

  protected readonly visible = signal(false);

  protected toggle(): void {
    this.visible.update((visible) => !visible);
  }
}
