import * as contract from '@shared/procedures/procedures-contract';
import type { Routes } from '../http/routes';
import { addStarterProcedures } from './add-starter-procedures';
import { beginDraft } from './begin-draft';
import { createProcedure } from './create-procedure';
import { discardDraft } from './discard-draft';
import { presentProcedure } from './present-procedure';
import { pageOfProcedures } from './procedure-queries';
import { publishDraft } from './publish-draft';
import { setProcedureRetired } from './set-procedure-retired';
import { saveDraft } from './save-draft';

export function proceduresRoutes(routes: Routes): void {
  routes.on(contract.listProcedures, ({ tenant, actor, query }) =>
    pageOfProcedures(tenant, actor, query),
  );

  routes.on(contract.addStarterProcedures, async ({ tenant, actor, now }) => ({
    added: await addStarterProcedures(tenant, actor, now()),
  }));

  routes.on(contract.createProcedure, async ({ tenant, actor, body }) => {
    await createProcedure(tenant, actor, body);
    return presentProcedure(tenant, actor, body.id);
  });

  routes.on(contract.readProcedure, ({ tenant, actor, params }) =>
    presentProcedure(tenant, actor, params.id),
  );

  routes.on(contract.beginDraft, async ({ tenant, actor, params, body }) => {
    await beginDraft(tenant, actor, { ...params, ...body });
    return presentProcedure(tenant, actor, params.id);
  });

  routes.on(contract.saveDraft, async ({ tenant, actor, params, body }) => {
    await saveDraft(tenant, actor, { ...params, ...body });
    return presentProcedure(tenant, actor, params.id);
  });

  routes.on(contract.discardDraft, async ({ tenant, actor, params, body }) => {
    await discardDraft(tenant, actor, { ...params, ...body });
    return presentProcedure(tenant, actor, params.id);
  });

  routes.on(contract.publishDraft, async ({ tenant, actor, params, body, now }) => {
    await publishDraft(tenant, actor, { ...params, ...body, at: now() });
    return presentProcedure(tenant, actor, params.id);
  });

  routes.on(contract.retireProcedure, async ({ tenant, actor, params, body, now }) => {
    await setProcedureRetired(tenant, actor, { ...params, ...body, at: now() });
    return presentProcedure(tenant, actor, params.id);
  });

  routes.on(contract.restoreProcedure, async ({ tenant, actor, params, body }) => {
    await setProcedureRetired(tenant, actor, { ...params, ...body, at: null });
    return presentProcedure(tenant, actor, params.id);
  });
}
