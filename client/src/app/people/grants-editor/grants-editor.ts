import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import type { Role, ScopeKind } from '@shared/access/role';
import { roles, scopeKinds } from '@shared/access/role';
import { groupOptions } from '../../fleet/group-options';
import { StorePicker } from '../../fleet/store-picker/store-picker';
import { roleWord } from '../../session/role-word';
import { Session } from '../../session/session';
import { FieldError } from '../../ui/form/field-error';
import { Icon } from '../../ui/icon/icon';
import { scopeKindWord } from '../people-words';
import type { GrantForm, GrantsForm } from './grants-form';
import { chooseKind, chooseRole, grantForm } from './grants-form';

/** The roles of a person, each with the place over which it is held. */
@Component({
  selector: 'vw-grants-editor',
  imports: [
    FieldError,
    Icon,
    MatButton,
    MatError,
    MatFormField,
    MatIconButton,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
    StorePicker,
  ],
  templateUrl: './grants-editor.html',
  styleUrl: './grants-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GrantsEditor {
  private readonly organisationId = inject(Session).current()?.organisation.id ?? '';

  readonly form = input.required<GrantsForm>();

  protected readonly roles = roles.map((value) => ({ value, label: roleWord(value) }));
  protected readonly kinds = scopeKinds.map((value) => ({ value, label: scopeKindWord(value) }));
  protected readonly regions = groupOptions('regions');
  protected readonly chains = groupOptions('chains');
  protected readonly labels = {
    role: $localize`:@@people.role:Role`,
    kind: $localize`:@@people.over:Over`,
    region: $localize`:@@people.region:Region`,
    chain: $localize`:@@people.chain:Chain`,
    store: $localize`:@@people.store:Store`,
  };

  protected choose(grant: GrantForm, role: Role): void {
    chooseRole(grant, role, this.organisationId);
  }

  protected chooseKind(grant: GrantForm, kind: ScopeKind): void {
    chooseKind(grant, kind, this.organisationId);
  }

  protected add(): void {
    this.form().push(grantForm());
    this.form().markAsDirty();
  }

  protected remove(index: number): void {
    this.form().removeAt(index);
    this.form().markAsDirty();
    this.form().markAsTouched();
  }
}
