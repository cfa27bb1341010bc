import * as contract from '@shared/people/people-contract';
import { exportTable } from '../exports/export-table';
import { pageBatches } from '../exports/read-batches';
import type { Routes } from '../http/routes';
import { editPerson } from './edit-person';
import { editRoles } from './edit-roles';
import { fileRowsOf, personColumns } from './export-columns';
import { inviteAgain, invitePerson } from './invite-person';
import { pageOfPeople, personById } from './person-queries';
import { activatePerson, deactivatePerson } from './set-person-active';

export function peopleRoutes(routes: Routes): void {
  const { BASE_URL } = routes.services.config;

  routes.on(contract.listPeople, ({ tenant, actor, query }) => pageOfPeople(tenant, actor, query));

  routes.download(contract.exportPeople, ({ tenant, actor, query: { format, ...filters }, now }) =>
    exportTable(actor, {
      name: { en: 'people', es: 'personas' },
      format,
      columns: personColumns,
      batches: pageBatches(async (page, pageSize) => {
        const { rows, total } = await pageOfPeople(tenant, actor, { ...filters, page, pageSize });
        return { rows: rows.flatMap(fileRowsOf), total };
      }),
      now: now(),
    }),
  );

  routes.on(contract.readPerson, ({ tenant, actor, params }) =>
    personById(tenant, actor, params.id),
  );

  routes.on(contract.invitePerson, async ({ tenant, actor, body, now }) => {
    await invitePerson(tenant, actor, body, BASE_URL, now());
    return personById(tenant, actor, body.id);
  });

  routes.on(contract.inviteAgain, async ({ tenant, actor, params, now }) => {
    await inviteAgain(tenant, actor, params.id, BASE_URL, now());
    return personById(tenant, actor, params.id);
  });

  routes.on(contract.editPerson, async ({ tenant, actor, params, body }) => {
    await editPerson(tenant, actor, params.id, body);
    return personById(tenant, actor, params.id);
  });

  routes.on(contract.editRoles, async ({ tenant, actor, params, body }) => {
    await editRoles(tenant, actor, params.id, body);
    return personById(tenant, actor, params.id);
  });

  routes.on(contract.deactivatePerson, async ({ tenant, actor, params, body, now }) => {
    await deactivatePerson(tenant, actor, params.id, body.version, now());
    return personById(tenant, actor, params.id);
  });

  routes.on(contract.activatePerson, async ({ tenant, actor, params, body }) => {
    await activatePerson(tenant, actor, params.id, body.version);
    return personById(tenant, actor, params.id);
  });
}
