import * as contract from '@shared/fleet/components-contract';
import type { Routes } from '../http/routes';
import { exportTable } from '../exports/export-table';
import { componentById, componentsForFile, pageOfComponents } from './component-queries';
import { editComponent } from './edit-component';
import { componentColumns } from './export-columns';
import { installComponent } from './install-component';
import { removeComponent } from './remove-component';
import { replaceComponent } from './replace-component';
import { undoRemoval } from './undo-removal';

export function componentRoutes(routes: Routes): void {
  routes.on(contract.listComponents, ({ tenant, actor, query }) =>
    pageOfComponents(tenant, actor, query),
  );

  routes.download(
    contract.exportComponents,
    async ({ tenant, actor, query: { format, ...filters }, now }) =>
      exportTable(actor, {
        name: { en: 'parts', es: 'piezas' },
        format,
        columns: componentColumns,
        batches: componentsForFile(tenant, actor, filters),
        now: now(),
      }),
  );

  routes.on(contract.installComponent, async ({ tenant, actor, params, body, now }) => {
    await installComponent(tenant, actor, { ...body, unitId: params.id, now: now() });
    return componentById(tenant, body.id);
  });

  routes.on(contract.editComponent, async ({ tenant, actor, params, body, now }) => {
    await editComponent(tenant, actor, { ...body, ...params, now: now() });
    return componentById(tenant, params.id);
  });

  routes.on(contract.replaceComponent, async ({ tenant, actor, params, body, now }) => {
    await replaceComponent(tenant, actor, { ...body, ...params, now: now() });
    return componentById(tenant, body.fitted.id);
  });

  routes.on(contract.removeComponent, async ({ tenant, actor, params, body, now }) => {
    await removeComponent(tenant, actor, { ...body, ...params, now: now() });
    return componentById(tenant, params.id);
  });

  routes.on(contract.undoRemoval, async ({ tenant, actor, params, body, now }) => {
    await undoRemoval(tenant, actor, { ...body, ...params, now: now() });
    return componentById(tenant, params.id);
  });
}
