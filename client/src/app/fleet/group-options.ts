import { computed, inject } from '@angular/core';
import type { GroupKind } from './fleet-api';
import { FleetApi } from './fleet-api';

/**
 * The chains or regions in sight as choices of a filter or a form, in order of name. Call it where
 * injection is possible.
 */
export function groupOptions(kind: GroupKind, state: 'live' | 'all' = 'live') {
  const list = inject(FleetApi).groups(kind, () => ({ state, pageSize: 200 }));
  return computed(() =>
    list.hasValue() ? list.value().rows.map(({ id, name }) => ({ value: id, label: name })) : [],
  );
}
