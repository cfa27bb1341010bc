import * as contract from '@shared/programmes/programmes-contract';
import type { Routes } from '../http/routes';
import { createProgramme } from './create-programme';
import { editEnrolment } from './edit-enrolment';
import { editProgramme } from './edit-programme';
import { enrol } from './enrol';
import { placesToEnrol } from './enrolment-queries';
import { presentProgramme } from './present-programme';
import { previewRecurrence } from './preview-recurrence';
import { findProgramme, pageOfProgrammes } from './programme-queries';
import { setProgrammeRetired } from './set-programme-retired';
import { unenrol } from './unenrol';

export function programmesRoutes(routes: Routes): void {
  routes.on(contract.listProgrammes, ({ tenant, query }) => pageOfProgrammes(tenant, query));

  routes.on(contract.readProgramme, ({ tenant, actor, params }) =>
    presentProgramme(tenant, actor, params.id),
  );

  routes.on(contract.createProgramme, async ({ tenant, actor, body }) => {
    await createProgramme(tenant, actor, body);
    return presentProgramme(tenant, actor, body.id);
  });

  routes.on(contract.editProgramme, async ({ tenant, actor, params, body }) => {
    await editProgramme(tenant, actor, { ...body, ...params });
    return presentProgramme(tenant, actor, params.id);
  });

  routes.on(contract.retireProgramme, async ({ tenant, actor, params, body, now }) => {
    await setProgrammeRetired(tenant, actor, { ...params, ...body, retired: true, now: now() });
    return presentProgramme(tenant, actor, params.id);
  });

  routes.on(contract.restoreProgramme, async ({ tenant, actor, params, body, now }) => {
    await setProgrammeRetired(tenant, actor, { ...params, ...body, retired: false, now: now() });
    return presentProgramme(tenant, actor, params.id);
  });

  routes.on(contract.findPlaces, async ({ tenant, actor, params, query }) => {
    await findProgramme(tenant, params.id);
    return placesToEnrol(tenant, actor, params.id, query);
  });

  routes.on(contract.enrol, async ({ tenant, actor, params, body, now }) => {
    await enrol(tenant, actor, { ...body, programmeId: params.id, now: now() });
    return presentProgramme(tenant, actor, params.id);
  });

  routes.on(contract.editEnrolment, async ({ tenant, actor, params, body, now }) => {
    const programmeId = await editEnrolment(tenant, actor, { ...body, ...params, now: now() });
    return presentProgramme(tenant, actor, programmeId);
  });

  routes.on(contract.unenrol, async ({ tenant, actor, params, body, now }) => {
    const programmeId = await unenrol(tenant, actor, { ...body, ...params, now: now() });
    return presentProgramme(tenant, actor, programmeId);
  });

  routes.on(contract.previewRecurrence, async ({ body, now }) => previewRecurrence(body, now()));
}
