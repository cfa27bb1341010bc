import type { RoleGrant } from '@shared/access/role';

/** Who acts: one person of one organisation with the roles held at this very request. */
export interface Actor {
  readonly personId: string;
  readonly organisationId: string;
  readonly name: string;
  readonly email: string | null;
  readonly locale: 'en' | 'es';
  readonly timeZone: string;
  readonly grants: readonly RoleGrant[];
}
