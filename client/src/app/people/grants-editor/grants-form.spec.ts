import { chooseKind, chooseRole, grantForm, grantsForm, grantsOf } from './grants-form';

const technician = {
  role: 'technician',
  scopeKind: 'region',
  scopeId: 'north',
  scopeName: 'North Lakes',
} as const;

describe('roles being chosen', () => {
  it('suggest the place that the role is usually held over', () => {
    const form = grantForm();
    chooseRole(form, 'administrator', 'org');
    expect(form.getRawValue()).toMatchObject({ scopeKind: 'organisation', scopeId: 'org' });
    chooseRole(form, 'store-manager', 'org');
    expect(form.getRawValue()).toMatchObject({ scopeKind: 'store', scopeId: '' });
  });

  it('keep a place that fits the kind, and forget one of another kind', () => {
    const form = grantForm(technician);
    chooseKind(form, 'region', 'org');
    expect(form.value.scopeId).toBe('north');
    chooseKind(form, 'chain', 'org');
    expect(form.getRawValue()).toMatchObject({ scopeId: '', scopeName: '' });
  });

  it('are sent once each, and at least one is needed', () => {
    expect(grantsForm().valid).toBe(false);
    const form = grantsForm([technician, technician]);
    expect(form.valid).toBe(true);
    expect(grantsOf(form)).toEqual([{ role: 'technician', scopeKind: 'region', scopeId: 'north' }]);
  });
});
