import { type ComponentKind, singleComponents } from '@shared/fleet/fleet-words';
import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

interface Fitted {
  readonly kind: ComponentKind;
  readonly pumpFace: string | null;
  readonly installedOn: string;
}

/**
 * Faults of a part as entered.
 * @param today the store's day: nothing is fitted in the future
 */
export function componentFaults(part: Fitted, today: string, at = ''): FieldError[] {
  const errors: FieldError[] = [];
  if (part.pumpFace !== null && part.kind !== 'pump') {
    errors.push({
      field: `${at}pumpFace`,
      reason: 'pump-only',
      message: 'Only a pump has a face with a drain slot or a gasket.',
    });
  }
  if (part.installedOn > today) errors.push(inFuture(`${at}installedOn`));
  return errors;
}

export const inFuture = (field: string): FieldError => ({
  field,
  reason: 'in-future',
  message: 'This day has not come yet.',
});

/**
 * Makes sure that a unit lacks this kind of part, unless it may have several.
 * @throws Problem 422 when one is fitted already.
 */
export async function requireFree(
  tenant: Tenant,
  unitId: string,
  kind: ComponentKind,
): Promise<void> {
  if (!singleComponents.includes(kind)) return;
  const fitted = await tenant.row(
    'SELECT id FROM components WHERE unit_id = $1 AND kind = $2 AND removed_on IS NULL',
    [unitId, kind],
  );
  if (!fitted) return;
  throw invalid([
    {
      field: 'kind',
      reason: 'part-fitted',
      message: 'The unit has one already. Replace that one, or take it off first.',
    },
  ]);
}
