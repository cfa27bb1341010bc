import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import { showInForm } from '../../problems/form-problems';
import { toProblem } from '../../problems/problem';
import { safeReturnUrl } from '../../session/return-url';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { PasswordField } from '../password-field/password-field';

/** E-mail address and password, and back to where the person wanted to go. */
@Component({
  selector: 'vw-sign-in-page',
  imports: [
    FieldError,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    PasswordField,
    ProblemSummary,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './sign-in-page.html',
  styleUrl: '../entrance/page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(Session);
  private readonly router = inject(Router);

  /** Query parameter. */
  readonly returnUrl = input<string>();

  protected readonly form = new FormGroup({
    email: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.email],
    }),
    password: new FormControl('', { nonNullable: true, validators: Validators.required }),
  });
  protected readonly labels = {
    email: $localize`:@@sign-in.email:E-mail address`,
    password: $localize`:@@sign-in.password:Password`,
  };
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  protected signIn(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const { email, password } = this.form.getRawValue();
    this.pending.set(true);
    this.session
      .signIn(email.trim(), password)
      .pipe(finalize(() => this.pending.set(false)))
      .subscribe({
        next: () => void this.router.navigateByUrl(safeReturnUrl(this.returnUrl())),
        error: (failure: unknown) => this.refuse(failure),
      });
  }

  private refuse(failure: unknown): void {
    const general =
      toProblem(failure).status === 401
        ? [
            $localize`:@@sign-in.refused:That e-mail address and password do not go together. Look at both again, or choose a new password.`,
          ]
        : showInForm(this.form, failure);
    this.general.set(general);
    this.tries.update((count) => count + 1);
  }
}
