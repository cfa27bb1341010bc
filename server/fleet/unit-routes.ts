import * as contract from '@shared/fleet/units-contract';
import type { Routes } from '../http/routes';
import { exportTable } from '../exports/export-table';
import { createUnit } from './create-unit';
import { editUnit } from './edit-unit';
import { unitFileColumns } from './export-columns';
import { setUnitRetired } from './set-unit-retired';
import { unitsForFile } from './unit-file';
import { unitLife } from './unit-life';
import { pageOfUnits, unitById } from './unit-queries';

export function unitRoutes(routes: Routes): void {
  routes.on(contract.listUnits, ({ tenant, actor, query }) => pageOfUnits(tenant, actor, query));

  routes.download(
    contract.exportUnits,
    async ({ tenant, actor, query: { format, ...filters }, now }) =>
      exportTable(actor, {
        name: { en: 'units', es: 'equipos' },
        format,
        columns: unitFileColumns,
        batches: unitsForFile(tenant, actor, filters),
        now: now(),
      }),
  );

  routes.on(contract.readUnit, ({ tenant, actor, params }) => unitById(tenant, actor, params.id));

  routes.on(contract.readUnitLife, ({ tenant, actor, params }) =>
    unitLife(tenant, actor, params.id),
  );

  routes.on(contract.createUnit, async ({ tenant, actor, body, now }) => {
    await createUnit(tenant, actor, { ...body, now: now() });
    return unitById(tenant, actor, body.id);
  });

  routes.on(contract.editUnit, async ({ tenant, actor, params, body, now }) => {
    await editUnit(tenant, actor, { ...body, ...params, now: now() });
    return unitById(tenant, actor, params.id);
  });

  routes.on(contract.retireUnit, async ({ tenant, actor, params, body, now }) => {
    await setUnitRetired(tenant, actor, { ...body, ...params, retired: true, now: now() });
    return unitById(tenant, actor, params.id);
  });

  routes.on(contract.restoreUnit, async ({ tenant, actor, params, body, now }) => {
    await setUnitRetired(tenant, actor, { ...body, ...params, retired: false, now: now() });
    return unitById(tenant, actor, params.id);
  });
}
