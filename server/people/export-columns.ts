import type { Role, ScopeKind } from '@shared/access/role';
import type { Standing } from '@shared/people/standing';
import { type ExportColumn, type Words, instant, text } from '../exports/export-column';
import type { PersonRow } from './person-queries';

/** One role of a person, or the person alone when they hold none. */
export interface PersonFileRow extends Omit<PersonRow, 'roles'> {
  readonly grant: PersonRow['roles'][number] | undefined;
}

const roleWords: Readonly<Record<Role, Words>> = {
  'regional-facility-manager': {
    en: 'regional facility manager',
    es: 'gerente regional de instalaciones',
  },
  technician: { en: 'technician', es: 'técnico' },
  'store-manager': { en: 'store manager', es: 'gerente de tienda' },
  'shift-lead': { en: 'shift lead', es: 'encargado de turno' },
  'account-owner': { en: 'account owner', es: 'responsable de cuenta' },
  trainer: { en: 'trainer', es: 'instructor' },
  administrator: { en: 'administrator', es: 'administrador' },
};

const scopeWords: Readonly<Record<ScopeKind, Words>> = {
  organisation: { en: 'organisation', es: 'organización' },
  chain: { en: 'chain', es: 'cadena' },
  region: { en: 'region', es: 'región' },
  store: { en: 'store', es: 'tienda' },
};

const standingWords: Readonly<Record<Standing, Words>> = {
  active: { en: 'active', es: 'activa' },
  invited: { en: 'invited', es: 'invitada' },
  deactivated: { en: 'deactivated', es: 'desactivada' },
};

export const personColumns: readonly ExportColumn<PersonFileRow>[] = [
  text({ en: 'Name', es: 'Nombre' }, (row) => row.name),
  text({ en: 'E-mail', es: 'Correo electrónico' }, (row) => row.email),
  text({ en: 'Role', es: 'Rol' }, (row) => row.grant && roleWords[row.grant.role]),
  text({ en: 'Over', es: 'Sobre' }, (row) => row.grant && scopeWords[row.grant.scopeKind]),
  text({ en: 'Place', es: 'Lugar' }, (row) => row.grant?.scopeName),
  text({ en: 'Sign-in', es: 'Acceso' }, (row) => standingWords[row.standing]),
  instant({ en: 'Last seen', es: 'Última vez' }, (row) => row.lastSeenAt),
  text({ en: 'Home ZIP code', es: 'Código postal de casa' }, (row) => row.homePostalCode),
  text({ en: 'Language of letters', es: 'Idioma de las cartas' }, (row) =>
    row.locale === 'es' ? 'Español' : 'English',
  ),
  text({ en: 'Time zone', es: 'Zona horaria' }, (row) => row.timeZone),
];

/** A line for each role, so that the file can be filtered by role and by place. */
export const fileRowsOf = ({ roles, ...person }: PersonRow): PersonFileRow[] =>
  (roles.length > 0 ? roles : [undefined]).map((grant) => ({ ...person, grant }));
