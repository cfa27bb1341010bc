import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { finalize, switchMap, tap } from 'rxjs';
import { showInForm } from '../../problems/form-problems';
import { toProblem } from '../../problems/problem';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { PageLoading } from '../../ui/page-states/page-loading';
import { newPasswordControl, newPasswordHint } from '../new-password';
import { PasswordField } from '../password-field/password-field';
import { SignInApi } from '../sign-in-api';

/** Where an invitation leads: the person's name as they write it, and a password. */
@Component({
  selector: 'vw-accept-invitation',
  imports: [
    FieldError,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    PageLoading,
    PasswordField,
    ProblemSummary,
    ProblemView,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './accept-invitation.html',
  styleUrl: '../entrance/page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AcceptInvitation {
  private readonly api = inject(SignInApi);
  private readonly session = inject(Session);
  private readonly router = inject(Router);

  /** From the address. */
  readonly token = input.required<string>();

  protected readonly invitation = rxResource({
    params: () => this.token(),
    stream: ({ params }) =>
      this.api
        .invitation(params)
        .pipe(tap((invitation) => this.form.controls.name.setValue(invitation.name))),
  });
  protected readonly spent = computed(() =>
    [404, 410].includes(toProblem(this.invitation.error()).status),
  );

  protected readonly form = new FormGroup({
    name: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(120)],
    }),
    password: newPasswordControl(),
  });
  protected readonly labels = {
    name: $localize`:@@sign-in.name:Your name`,
    password: $localize`:@@sign-in.password:Password`,
  };
  protected readonly hint = newPasswordHint;
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  protected accept(email: string): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const { name, password } = this.form.getRawValue();
    this.pending.set(true);
    this.api
      .acceptInvitation(this.token(), password, name.trim())
      .pipe(
        switchMap(() => this.session.signIn(email, password)),
        finalize(() => this.pending.set(false)),
      )
      .subscribe({
        next: () => void this.router.navigateByUrl('/'),
        error: (failure: unknown) => {
          this.general.set(showInForm(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
