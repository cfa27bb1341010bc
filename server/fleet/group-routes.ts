import * as contract from '@shared/fleet/groups-contract';
import type { Routes } from '../http/routes';
import { exportTable } from '../exports/export-table';
import { pageBatches } from '../exports/read-batches';
import { createGroup } from './create-group';
import { editGroup } from './edit-group';
import { groupColumns } from './export-columns';
import { type GroupKind, groupById, pageOfGroups } from './group-queries';
import { setGroupRetired } from './set-group-retired';

const ofKind = {
  chain: {
    list: contract.listChains,
    file: contract.exportChains,
    name: { en: 'chains', es: 'cadenas' },
    create: contract.createChain,
    edit: contract.editChain,
    retire: contract.retireChain,
    restore: contract.restoreChain,
  },
  region: {
    list: contract.listRegions,
    file: contract.exportRegions,
    name: { en: 'regions', es: 'regiones' },
    create: contract.createRegion,
    edit: contract.editRegion,
    retire: contract.retireRegion,
    restore: contract.restoreRegion,
  },
} as const;

/** Chains and regions: the same calls on either. */
export function groupRoutes(routes: Routes, kind: GroupKind): void {
  const { list, file, name, create, edit, retire, restore } = ofKind[kind];

  routes.on(list, ({ tenant, actor, query }) => pageOfGroups(tenant, actor, kind, query));

  routes.download(file, async ({ tenant, actor, query: { format, ...filters }, now }) =>
    exportTable(actor, {
      name,
      format,
      columns: groupColumns(kind),
      batches: pageBatches((page, pageSize) =>
        pageOfGroups(tenant, actor, kind, { ...filters, page, pageSize }),
      ),
      now: now(),
    }),
  );

  routes.on(create, async ({ tenant, actor, body }) => {
    await createGroup(tenant, actor, kind, body);
    return groupById(tenant, actor, kind, body.id);
  });

  routes.on(edit, async ({ tenant, actor, params, body }) => {
    await editGroup(tenant, actor, kind, { ...params, ...body });
    return groupById(tenant, actor, kind, params.id);
  });

  routes.on(retire, async ({ tenant, actor, params, body, now }) => {
    await setGroupRetired(tenant, actor, kind, { ...params, ...body, retired: true, now: now() });
    return groupById(tenant, actor, kind, params.id);
  });

  routes.on(restore, async ({ tenant, actor, params, body, now }) => {
    await setGroupRetired(tenant, actor, kind, { ...params, ...body, retired: false, now: now() });
    return groupById(tenant, actor, kind, params.id);
  });
}
