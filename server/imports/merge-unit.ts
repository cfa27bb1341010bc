import type { State } from './fleet-memory';
import type { UnitColumns } from './fleet-records';
import type { RowDraft } from './row-draft';

/**
 * A unit after a row: what the row says, else what was known.
 * @param today the store's day
 * @returns undefined, and the faults in the draft, where the row cannot be taken
 */
export function mergeUnit(
  draft: RowDraft,
  storeId: string,
  before: UnitColumns | null,
  id: string,
  today: string,
): State<UnitColumns> | undefined {
  const { values, number } = draft.row;
  draft.notAhead('unitInstalledOn', values.unitInstalledOn, today);
  draft.notAhead('outOfServiceSince', values.outOfServiceSince, today);
  const vats = values.vats ?? before?.vats;
  if (vats === undefined) draft.need('vats');
  if (vats === undefined || draft.isBad) return undefined;
  const oil = values.oilPounds;
  const columns: UnitColumns = {
    store_id: storeId,
    tag: before?.tag ?? values.unitTag ?? '',
    kind: values.unitKind ?? before?.kind ?? 'built-in',
    vats,
    // The database keeps one decimal.
    oil_pounds: oil === undefined ? (before?.oil_pounds ?? null) : Math.round(oil * 10) / 10,
    model: values.unitModel ?? before?.model ?? '',
    installed_on: values.unitInstalledOn ?? before?.installed_on ?? null,
    out_of_service_since: values.outOfServiceSince ?? before?.out_of_service_since ?? null,
  };
  return { id, columns, retired: false, row: number };
}
