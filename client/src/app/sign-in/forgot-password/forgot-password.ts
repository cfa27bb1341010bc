import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import { showInForm } from '../../problems/form-problems';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { SignInApi } from '../sign-in-api';

/** Asks for a letter with a link to choose a new password. */
@Component({
  selector: 'vw-forgot-password',
  imports: [
    FieldError,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ProblemSummary,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './forgot-password.html',
  styleUrl: '../entrance/page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgotPassword {
  private readonly api = inject(SignInApi);

  protected readonly form = new FormGroup({
    email: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.email],
    }),
  });
  protected readonly labels = { email: $localize`:@@sign-in.email:E-mail address` };
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  /** The address to which the letter went, once it did. */
  protected readonly sentTo = signal('');

  protected send(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const email = this.form.getRawValue().email.trim();
    this.pending.set(true);
    this.api
      .requestReset(email)
      .pipe(finalize(() => this.pending.set(false)))
      .subscribe({
        next: () => this.sentTo.set(email),
        error: (failure: unknown) => {
          this.general.set(showInForm(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
