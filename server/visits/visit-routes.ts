import * as contract from '@shared/visits/visits-contract';
import type { Routes } from '../http/routes';
import { addVisit } from './add-visit';
import { comingVisits } from './coming-query';
import { editVisit } from './edit-visit';
import { moveVisit } from './move-visit';
import { orderNearestNext, orderRoute } from './order-route';
import { readPlanOf } from './plan-query';
import { publishRoute } from './publish-route';
import { removeVisit } from './remove-visit';
import { plannedRoute, routeById } from './route-queries';
import { unplannedStores } from './unplanned-query';

export function visitRoutes(routes: Routes): void {
  routes.on(contract.readPlan, ({ tenant, actor, query, now }) =>
    readPlanOf(tenant, actor, query, now()),
  );

  routes.on(contract.readRoute, ({ tenant, actor, params, now }) =>
    routeById(tenant, actor, params.id, now()),
  );

  routes.on(contract.listUnplanned, ({ tenant, actor, query, now }) =>
    unplannedStores(tenant, actor, query, now()),
  );

  routes.on(contract.listComing, ({ tenant, actor, query, now }) =>
    comingVisits(tenant, actor, query, now()),
  );

  routes.on(contract.addVisit, async ({ tenant, actor, body, now }) => {
    const routeId = await addVisit(tenant, actor, body, now());
    return plannedRoute(tenant, actor, routeId, now());
  });

  routes.on(contract.editVisit, async ({ tenant, actor, params, body, now }) => {
    const routeId = await editVisit(tenant, actor, params.id, body, now());
    return plannedRoute(tenant, actor, routeId, now());
  });

  routes.on(contract.moveVisit, async ({ tenant, actor, params, body, now }) => {
    const routeId = await moveVisit(tenant, actor, params.id, body, now());
    return plannedRoute(tenant, actor, routeId, now());
  });

  routes.on(contract.removeVisit, async ({ tenant, actor, params, body, now }) => {
    const routeId = await removeVisit(tenant, actor, params.id, body.version);
    return plannedRoute(tenant, actor, routeId, now());
  });

  routes.on(contract.orderRoute, async ({ tenant, actor, params, body, now }) => {
    await routeById(tenant, actor, params.id, now());
    await orderRoute(tenant, actor, params.id, body);
    return plannedRoute(tenant, actor, params.id, now());
  });

  routes.on(contract.orderNearestNext, async ({ tenant, actor, params, body, now }) => {
    await routeById(tenant, actor, params.id, now());
    await orderNearestNext(tenant, actor, params.id, body.version);
    return plannedRoute(tenant, actor, params.id, now());
  });

  routes.on(contract.publishRoute, async ({ tenant, actor, params, body, now }) => {
    await routeById(tenant, actor, params.id, now());
    await publishRoute(tenant, actor, params.id, body.version, now());
    return plannedRoute(tenant, actor, params.id, now());
  });
}
