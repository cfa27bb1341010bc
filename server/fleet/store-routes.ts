import * as contract from '@shared/fleet/stores-contract';
import type { Routes } from '../http/routes';
import { exportTable } from '../exports/export-table';
import { createStore } from './create-store';
import { editStore } from './edit-store';
import { storeColumns } from './export-columns';
import { findPlace } from './find-place';
import { setStoreRetired } from './set-store-retired';
import { pageOfStores, storeById, storesForFile } from './store-queries';

export function storeRoutes(routes: Routes): void {
  routes.on(contract.listStores, ({ tenant, actor, query }) => pageOfStores(tenant, actor, query));

  routes.download(
    contract.exportStores,
    async ({ tenant, actor, query: { format, ...filters }, now }) =>
      exportTable(actor, {
        name: { en: 'stores', es: 'locales' },
        format,
        columns: storeColumns,
        batches: storesForFile(tenant, actor, filters),
        now: now(),
      }),
  );

  routes.on(contract.locateStore, async ({ query }) => ({ place: findPlace(query) }));

  routes.on(contract.readStore, ({ tenant, actor, params }) => storeById(tenant, actor, params.id));

  routes.on(contract.createStore, async ({ tenant, actor, body, now }) => {
    await createStore(tenant, actor, { ...body, now: now() });
    return storeById(tenant, actor, body.id);
  });

  routes.on(contract.editStore, async ({ tenant, actor, params, body, now }) => {
    await editStore(tenant, actor, { ...body, ...params, now: now() });
    return storeById(tenant, actor, params.id);
  });

  routes.on(contract.retireStore, async ({ tenant, actor, params, body, now }) => {
    await setStoreRetired(tenant, actor, { ...body, ...params, retired: true, now: now() });
    return storeById(tenant, actor, params.id);
  });

  routes.on(contract.restoreStore, async ({ tenant, actor, params, body, now }) => {
    await setStoreRetired(tenant, actor, { ...body, ...params, retired: false, now: now() });
    return storeById(tenant, actor, params.id);
  });
}
