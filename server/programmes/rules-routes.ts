import * as contract from '@shared/programmes/programmes-contract';
import type { Routes } from '../http/routes';
import { addRule } from './add-rule';
import { editRule } from './edit-rule';
import { presentRevisions, presentRuleById } from './present-rule';
import { previewRuleEdit } from './preview-rule-edit';
import { rulesToChoose } from './programme-queries';
import { setRuleRetired } from './set-rule-retired';

export function rulesRoutes(routes: Routes): void {
  routes.on(contract.listRules, ({ tenant, query }) => rulesToChoose(tenant, query));

  routes.on(contract.readRule, ({ tenant, actor, params }) =>
    presentRuleById(tenant, actor, params.id),
  );

  routes.on(contract.listRuleRevisions, ({ tenant, params }) =>
    presentRevisions(tenant, params.id),
  );

  routes.on(contract.addRule, async ({ tenant, actor, params, body, now }) => {
    await addRule(tenant, actor, { ...body, programmeId: params.id, now: now() });
    return presentRuleById(tenant, actor, body.id);
  });

  routes.on(contract.editRule, async ({ tenant, actor, params, body, now }) => {
    await editRule(tenant, actor, { ...body, ...params, now: now() });
    return presentRuleById(tenant, actor, params.id);
  });

  routes.on(contract.previewRuleEdit, ({ tenant, actor, params, body, now }) =>
    previewRuleEdit(tenant, actor, { ...body, ...params, now: now() }),
  );

  routes.on(contract.retireRule, async ({ tenant, actor, params, body, now }) => {
    await setRuleRetired(tenant, actor, { ...params, ...body, retired: true, now: now() });
    return presentRuleById(tenant, actor, params.id);
  });

  routes.on(contract.restoreRule, async ({ tenant, actor, params, body, now }) => {
    await setRuleRetired(tenant, actor, { ...params, ...body, retired: false, now: now() });
    return presentRuleById(tenant, actor, params.id);
  });
}
