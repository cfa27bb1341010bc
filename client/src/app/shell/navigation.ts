import type { Ability } from '@shared/access/ability';
import type { Role } from '@shared/access/role';
import type { IconName } from '../ui/icon/icon-paths';

/** An entry of the navigation; who holds none of its abilities is not shown it. */
export interface NavigationItem {
  /** Path of the feature in `app.routes.ts`. */
  readonly path: string;
  readonly label: string;
  readonly icon: IconName;
  readonly anyOf: readonly Ability[];
}

/** In the order in which they stand in the header; what does not fit goes under "More". */
export const navigation: readonly NavigationItem[] = [
  {
    path: 'today',
    label: $localize`:@@today.title:Today`,
    icon: 'route',
    anyOf: ['today.read'],
  },
  {
    path: 'shift',
    label: $localize`:@@shift-checks.title:Shift`,
    icon: 'check',
    anyOf: ['shift.read'],
  },
  {
    path: 'board',
    label: $localize`:@@tasks.board.title:Board`,
    icon: 'board',
    anyOf: ['board.read'],
  },
  {
    path: 'tasks',
    label: $localize`:@@tasks.title:Tasks`,
    icon: 'list',
    anyOf: ['board.read', 'tasks.do', 'compliance.read'],
  },
  {
    path: 'visits',
    label: $localize`:@@visits.title:Visits`,
    icon: 'route',
    anyOf: ['visits.read'],
  },
  {
    path: 'fleet',
    label: $localize`:@@fleet.title:Fleet`,
    icon: 'store',
    anyOf: ['fleet.read'],
  },
  {
    path: 'programmes',
    label: $localize`:@@programmes.title:Programmes`,
    icon: 'programme',
    anyOf: ['programmes.read'],
  },
  {
    path: 'procedures',
    label: $localize`:@@procedures.title:Procedures`,
    icon: 'procedure',
    anyOf: ['procedures.read'],
  },
  {
    path: 'findings',
    label: $localize`:@@findings.title:Findings`,
    icon: 'finding',
    anyOf: ['findings.read'],
  },
  {
    path: 'people',
    label: $localize`:@@people.title:People`,
    icon: 'people',
    anyOf: ['people.read'],
  },
  {
    path: 'compliance',
    label: $localize`:@@compliance.title:Compliance`,
    icon: 'chart',
    anyOf: ['compliance.read'],
  },
  {
    path: 'digests',
    label: $localize`:@@digests.title:Digests`,
    icon: 'history',
    anyOf: ['digests.read'],
  },
  {
    path: 'letters',
    label: $localize`:@@letters.title:Letters`,
    icon: 'mail',
    anyOf: ['mail.read'],
  },
];

/** Where each role starts, the broadest role of a person deciding. */
const starts: readonly (readonly [Role, string])[] = [
  ['regional-facility-manager', 'board'],
  ['technician', 'today'],
  ['store-manager', 'shift'],
  ['shift-lead', 'shift'],
  ['account-owner', 'digests'],
  ['trainer', 'procedures'],
  ['administrator', 'fleet'],
];

/**
 * The first page for a person: that of their role if they may see it, else the first entry they
 * may see, else their account.
 */
export function landingPath(
  roles: readonly Role[],
  can: (ability: Ability) => boolean,
  items: readonly NavigationItem[] = navigation,
): string {
  const allowed = items.filter((item) => item.anyOf.some(can));
  const own = starts.filter(([role]) => roles.includes(role)).map(([, path]) => path);
  const start = own.find((path) => allowed.some((item) => item.path === path));
  return `/${start ?? allowed[0]?.path ?? 'account'}`;
}
