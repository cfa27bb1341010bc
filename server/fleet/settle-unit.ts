import type { BodyOf } from '@shared/contract/endpoint';
import type { editUnit } from '@shared/fleet/units-contract';
import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { inFuture } from './check-component';
import type { UnitColumns } from './editable-unit';

export type UnitInput = Omit<BodyOf<typeof editUnit>, 'version'>;

/**
 * Holds a unit as entered against its store and the calendar.
 * @param today the store's day
 * @throws Problem 422 with every field at fault, those given along first.
 */
export async function settleUnit(
  tenant: Tenant,
  id: string,
  input: UnitInput,
  today: string,
  faults: readonly FieldError[] = [],
): Promise<UnitColumns> {
  const errors = [...faults];
  if (input.installedOn !== null && input.installedOn > today) errors.push(inFuture('installedOn'));
  if (input.outOfServiceSince !== null && input.outOfServiceSince > today) {
    errors.push(inFuture('outOfServiceSince'));
  }
  const taken = await tenant.row(
    'SELECT id FROM units WHERE store_id = $1 AND tag = $2 AND id <> $3',
    [input.storeId, input.tag, id],
  );
  if (taken) {
    errors.push({
      field: 'tag',
      reason: 'unit-tag-taken',
      message: 'Another unit of this store has this tag.',
    });
  }
  if (errors.length > 0) throw invalid(errors);
  return {
    store_id: input.storeId,
    tag: input.tag,
    kind: input.kind,
    vats: input.vats,
    oil_pounds: input.oilPounds,
    model: input.model,
    installed_on: input.installedOn,
    out_of_service_since: input.outOfServiceSince,
  };
}
