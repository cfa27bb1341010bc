import type { ImportKind } from '@shared/imports/import-fields';
import type { Import } from './imports-api';

/** What a file of this kind is about. */
export function importKindWord(kind: ImportKind): string {
  switch (kind) {
    case 'chains':
      return $localize`:@@imports.kind.chains:Chains`;
    case 'regions':
      return $localize`:@@imports.kind.regions:Regions`;
    case 'stores':
      return $localize`:@@imports.kind.stores:Stores`;
    case 'units':
      return $localize`:@@imports.kind.units:Units`;
    case 'components':
      return $localize`:@@imports.kind.components:Parts`;
  }
}

/** What one row of such a file says. */
export function importKindNote(kind: ImportKind): string {
  switch (kind) {
    case 'chains':
      return $localize`:@@imports.kind-note.chains:One chain per row, by its name.`;
    case 'regions':
      return $localize`:@@imports.kind-note.regions:One region per row, by its name.`;
    case 'stores':
      return $localize`:@@imports.kind-note.stores:One store per row, with address and hours. Chains and regions that are new are made.`;
    case 'units':
      return $localize`:@@imports.kind-note.units:One unit per row, with its pump, motor, pan and hose. Can hold the stores too, so one file is enough to begin.`;
    case 'components':
      return $localize`:@@imports.kind-note.components:One part per row, for units that are known already.`;
  }
}

export function importStateWord(state: Import['state']): string {
  switch (state) {
    case 'mapping':
      return $localize`:@@imports.state.mapping:columns to confirm`;
    case 'checking':
      return $localize`:@@imports.state.checking:being checked`;
    case 'checked':
      return $localize`:@@imports.state.checked:ready to take in`;
    case 'importing':
      return $localize`:@@imports.state.importing:being taken in`;
    case 'imported':
      return $localize`:@@imports.state.imported:taken in`;
    case 'failed':
      return $localize`:@@imports.state.failed:failed`;
    case 'cancelled':
      return $localize`:@@imports.state.cancelled:stopped`;
  }
}
