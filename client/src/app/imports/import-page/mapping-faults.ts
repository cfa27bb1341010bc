import type { ImportField, ImportKind } from '@shared/imports/import-fields';
import { neededFields } from '@shared/imports/import-fields';

export interface MappingFaults {
  /** Fields without whose column the file cannot be read. */
  readonly missing: readonly ImportField[];
  /** Fields that more than one column is taken for. */
  readonly doubled: readonly ImportField[];
}

/** What keeps the columns, as they are now taken, from being checked. */
export function mappingFaults(
  kind: ImportKind,
  fields: readonly (ImportField | null)[],
): MappingFaults {
  const taken = fields.filter((field) => field !== null);
  return {
    missing: neededFields[kind].filter((field) => !taken.includes(field)),
    doubled: [...new Set(taken.filter((field, index) => taken.indexOf(field) < index))],
  };
}
