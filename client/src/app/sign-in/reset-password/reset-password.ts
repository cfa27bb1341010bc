import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { finalize } from 'rxjs';
import { showInForm } from '../../problems/form-problems';
import { toProblem } from '../../problems/problem';
import { Notices } from '../../ui/notice/notices';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { newPasswordControl, newPasswordHint } from '../new-password';
import { PasswordField } from '../password-field/password-field';
import { SignInApi } from '../sign-in-api';

/** Where the link of the letter leads: a new password. */
@Component({
  selector: 'vw-reset-password',
  imports: [MatButton, PasswordField, ProblemSummary, ReactiveFormsModule, RouterLink],
  templateUrl: './reset-password.html',
  styleUrl: '../entrance/page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResetPassword {
  private readonly api = inject(SignInApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);

  /** From the address. */
  readonly token = input.required<string>();

  protected readonly form = new FormGroup({ password: newPasswordControl() });
  protected readonly labels = { password: $localize`:@@sign-in.new-password:New password` };
  protected readonly hint = newPasswordHint;
  protected readonly pending = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly spent = signal(false);

  protected save(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    this.pending.set(true);
    this.api
      .resetPassword(this.token(), this.form.getRawValue().password)
      .pipe(finalize(() => this.pending.set(false)))
      .subscribe({
        next: () => {
          this.notices.tell({
            text: $localize`:@@sign-in.reset-done:Your new password holds. Sign in with it.`,
          });
          void this.router.navigateByUrl('/sign-in');
        },
        error: (failure: unknown) => this.refuse(failure),
      });
  }

  private refuse(failure: unknown): void {
    if ([404, 410].includes(toProblem(failure).status)) {
      this.spent.set(true);
      return;
    }
    this.general.set(showInForm(this.form, failure));
    this.tries.update((count) => count + 1);
  }
}
