/** The roles of the product; a person can hold several, each over scopes of its own. */
export const roles = [
  'regional-facility-manager',
  'technician',
  'store-manager',
  'shift-lead',
  'account-owner',
  'trainer',
  'administrator',
] as const;

export type Role = (typeof roles)[number];

export const scopeKinds = ['organisation', 'chain', 'region', 'store'] as const;

export type ScopeKind = (typeof scopeKinds)[number];

/** A role over one scope: the whole organisation, a chain, a region or a store. */
export interface RoleGrant {
  readonly role: Role;
  readonly scopeKind: ScopeKind;
  readonly scopeId: string;
}

/** Where a thing stands, as far as scopes care. */
export interface Place {
  readonly chainId: string;
  readonly regionId: string;
  readonly storeId: string;
}
