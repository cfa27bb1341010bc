import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Role, ScopeKind } from '@shared/access/role';
import type { Grant } from '../people-api';

export type GrantForm = ReturnType<typeof grantForm>;
export type GrantsForm = FormArray<GrantForm>;

/** Over what a role is held most of the time: what is chosen for whoever chooses a role. */
const usualScope: Readonly<Record<Role, ScopeKind>> = {
  'regional-facility-manager': 'region',
  technician: 'region',
  'store-manager': 'store',
  'shift-lead': 'store',
  'account-owner': 'chain',
  trainer: 'organisation',
  administrator: 'organisation',
};

/** One role over one place, being chosen; `scopeName` is what the place is called. */
export function grantForm(grant?: Grant & { readonly scopeName: string }) {
  return new FormGroup({
    role: new FormControl<Role | ''>(grant?.role ?? '', {
      nonNullable: true,
      validators: Validators.required,
    }),
    scopeKind: new FormControl<ScopeKind>(grant?.scopeKind ?? 'region', { nonNullable: true }),
    scopeId: new FormControl(grant?.scopeId ?? '', {
      nonNullable: true,
      validators: Validators.required,
    }),
    scopeName: new FormControl(grant?.scopeName ?? '', { nonNullable: true }),
  });
}

export function grantsForm(grants: readonly (Grant & { readonly scopeName: string })[] = []) {
  return new FormArray(grants.map(grantForm), {
    validators: (array) => ((array as FormArray).length === 0 ? { required: true } : null),
  });
}

/** Takes the place that the role is usually held over, and forgets a place of another kind. */
export function chooseRole(form: GrantForm, role: Role, organisationId: string): void {
  chooseKind(form, usualScope[role], organisationId);
}

export function chooseKind(form: GrantForm, kind: ScopeKind, organisationId: string): void {
  const { scopeKind, scopeId, scopeName } = form.controls;
  if (scopeKind.value === kind && (kind !== 'organisation' || scopeId.value !== '')) return;
  scopeKind.setValue(kind);
  scopeId.setValue(kind === 'organisation' ? organisationId : '');
  scopeId.markAsUntouched();
  scopeName.setValue('');
}

/** What is sent: the same role over the same place once. */
export function grantsOf(form: GrantsForm): Grant[] {
  const seen = new Map<string, Grant>();
  for (const { role, scopeKind, scopeId } of form.getRawValue()) {
    if (role === '') continue;
    seen.set(`${role} ${scopeKind} ${scopeId}`, { role, scopeKind, scopeId });
  }
  return [...seen.values()];
}
