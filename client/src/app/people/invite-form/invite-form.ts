import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { newId } from '../../api/new-id';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { DetailsFields } from '../details-fields/details-fields';
import { detailsForm, detailsLabels, detailsOf } from '../details-fields/details-form';
import { GrantsEditor } from '../grants-editor/grants-editor';
import { grantForm, grantsForm, grantsOf } from '../grants-editor/grants-form';
import { PeopleApi } from '../people-api';
import { showPeopleFaults } from '../people-problem';

/** Invites somebody: who they are, what they may do where, and a letter to them. */
@Component({
  selector: 'vw-invite-form',
  imports: [
    DetailsFields,
    FieldError,
    GrantsEditor,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    PageHeader,
    ProblemSummary,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './invite-form.html',
  styleUrl: '../../fleet/fleet-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InviteForm {
  private readonly api = inject(PeopleApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  /** Made once, so that sending twice invites once. */
  private readonly id = newId();

  protected readonly form = new FormGroup({
    ...detailsForm({ timeZone: inject(Session).timeZone() }).controls,
    email: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.email, Validators.maxLength(254)],
    }),
    roles: grantsForm(),
  });
  protected readonly labels = {
    ...detailsLabels(),
    email: $localize`:@@people.email:E-mail`,
    roles: $localize`:@@people.roles:Roles`,
  };
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);

  constructor() {
    this.form.controls.roles.push(grantForm());
  }

  readonly hasUnsavedWork = (): boolean => this.form.dirty;

  protected send(): void {
    this.general.set([]);
    if (this.form.invalid) {
      this.form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const email = this.form.controls.email.value.trim();
    this.busy.set(true);
    this.api
      .invite({
        ...detailsOf(this.form),
        id: this.id,
        email,
        roles: grantsOf(this.form.controls.roles),
      })
      .subscribe({
        next: (person) => {
          this.form.markAsPristine();
          this.notices.tell({
            text: $localize`:@@people.invited:The invitation to ${email}:email: is on its way.`,
          });
          void this.router.navigate(['/people', person.id], { replaceUrl: true });
        },
        error: (failure: unknown) => {
          this.busy.set(false);
          this.general.set(showPeopleFaults(this.form, failure));
          this.tries.update((count) => count + 1);
        },
      });
  }
}
