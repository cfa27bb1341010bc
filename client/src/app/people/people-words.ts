import type { RoleGrant, ScopeKind } from '@shared/access/role';
import type { Standing } from '@shared/people/standing';
import { roleWord } from '../session/role-word';
import type { FilterOption } from '../ui/filter-bar/filter-select';

/** The words for whether somebody can sign in. */
export function standingWord(standing: Standing): string {
  switch (standing) {
    case 'active':
      return $localize`:@@people.standing.active:active`;
    case 'invited':
      return $localize`:@@people.standing.invited:invited`;
    case 'deactivated':
      return $localize`:@@people.standing.deactivated:deactivated`;
  }
}

/** What a role can reach over. */
export function scopeKindWord(kind: ScopeKind): string {
  switch (kind) {
    case 'organisation':
      return $localize`:@@people.scope.organisation:the whole organisation`;
    case 'chain':
      return $localize`:@@people.scope.chain:a chain`;
    case 'region':
      return $localize`:@@people.scope.region:a region`;
    case 'store':
      return $localize`:@@people.scope.store:a store`;
  }
}

/** A role with where it is held: "technician · North Lakes". */
export function grantWords(
  grant: Pick<RoleGrant, 'role' | 'scopeKind'> & { readonly scopeName: string },
): string {
  const where =
    grant.scopeKind === 'organisation' ? scopeKindWord('organisation') : grant.scopeName;
  return `${roleWord(grant.role)} · ${where}`;
}

/** Choices of the list's filter by standing. */
export function standingOptions(): readonly FilterOption[] {
  return [
    ...(['active', 'invited', 'deactivated'] as const).map((value) => ({
      value,
      label: standingWord(value),
    })),
    { value: 'all', label: $localize`:@@people.standing.all:all` },
  ];
}
