import type { BodyOf } from '@shared/contract/endpoint';
import type { installComponent } from '@shared/fleet/components-contract';
import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';

export type NewComponent = BodyOf<typeof installComponent>;

/** Writes a part into a unit. @throws Problem 409 when its id is taken. */
export async function insertComponent(
  tenant: Tenant,
  unitId: string,
  part: NewComponent,
): Promise<void> {
  const made = await tenant.row(
    `INSERT INTO components (id, organisation_id, unit_id, kind, serial_number, model, nameplate,
       pump_face, installed_on)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9) ON CONFLICT DO NOTHING RETURNING id`,
    [
      part.id,
      tenant.organisationId,
      unitId,
      part.kind,
      part.serialNumber,
      part.model,
      JSON.stringify(part.nameplate),
      part.pumpFace,
      part.installedOn,
    ],
  );
  if (!made) throw conflict();
}
