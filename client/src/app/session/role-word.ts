import type { Role } from '@shared/access/role';

/** The word for a role, as it stands in running text. */
export function roleWord(role: Role): string {
  switch (role) {
    case 'regional-facility-manager':
      return $localize`:@@session.role.regional-facility-manager:regional facility manager`;
    case 'technician':
      return $localize`:@@session.role.technician:technician`;
    case 'store-manager':
      return $localize`:@@session.role.store-manager:store manager`;
    case 'shift-lead':
      return $localize`:@@session.role.shift-lead:shift lead`;
    case 'account-owner':
      return $localize`:@@session.role.account-owner:account owner`;
    case 'trainer':
      return $localize`:@@session.role.trainer:trainer`;
    case 'administrator':
      return $localize`:@@session.role.administrator:administrator`;
  }
}
