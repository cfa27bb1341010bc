import type { FormGroupDirective } from '@angular/forms';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { finalize } from 'rxjs';
import { showInForm } from '../../problems/form-problems';
import { Session } from '../../session/session';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import { AccountApi } from '../account-api';
import { newPasswordControl, newPasswordHint } from '../new-password';
import { PasswordField } from '../password-field/password-field';

/** A new password, on giving the present one. */
@Component({
  selector: 'vw-password-form',
  imports: [MatButton, PasswordField, ProblemSummary, ReactiveFormsModule],
  templateUrl: './password-form.html',
  styleUrl: './section.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordForm {
  private readonly api = inject(AccountApi);
  private readonly notices = inject(Notices);
  protected readonly email = inject(Session).person()?.email ?? '';

  protected readonly form = new FormGroup({
    currentPassword: new FormControl('', {
      nonNullable: true,
      validators: Validators.required,
    }),
    newPassword: newPasswordControl(),
  });
  protected readonly labels = {
    currentPassword: $localize`:@@sign-in.current-password:Current password`,
    newPassword: $localize`:@@sign-in.new-password:New password`,
  };
  protected readonly hint = newPasswordHint;
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  protected save(form: FormGroupDirective): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const { currentPassword, newPassword } = this.form.getRawValue();
    this.pending.set(true);
    this.api
      .changePassword(currentPassword, newPassword)
      .pipe(finalize(() => this.pending.set(false)))
      .subscribe({
        next: () => {
          form.resetForm();
          this.tries.set(0);
          this.notices.tell({
            text: $localize`:@@sign-in.password-changed:Your new password holds. Other devices are signed out.`,
          });
        },
        error: (failure: unknown) => {
          this.general.set(showInForm(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
