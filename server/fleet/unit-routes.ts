import * as contract from '@shared/fleet/units-contract';
import type { Routes } from '../http/routes';
import { createUnit } from './create-unit';
import { editUnit } from './edit-unit';
import { setUnitRetired } from './set-unit-retired';
import { unitLife } from './unit-life';
import { pageOfUnits, unitById } from './unit-queries';

export function unitRoutes(routes: Routes): void {
  routes.on(contract.listUnits, ({ tenant, actor, query }) => pageOfUnits(tenant, actor, query));

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
