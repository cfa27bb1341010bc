import { Problem } from '@shared/problem';
import { readSession, signIn, signOut } from '@shared/sign-in/sign-in-contract';
import { inTenant } from '@db/tenant-transaction';
import { loadActor } from '../access/load-actor';
import { recordEvent } from '../audit/record-event';
import { issueToken } from '../http/cross-site-defence';
import type { Routes } from '../http/routes';
import { accountRoutes } from './account-routes';
import { findSignIn } from './find-sign-in';
import { passwordFits } from './password';
import { presentSession } from './present-session';
import { endSession, startSession } from './session-life';
import { signInLimits } from './sign-in-limits';

export function signInRoutes(routes: Routes): void {
  const limits = signInLimits(routes.services);

  routes.open(signIn, async ({ body, sequelize, config, req, res }) => {
    const email = body.email.trim().toLowerCase();
    const address = req.ip ?? 'unknown';
    await limits.take(address, email);
    const found = await findSignIn(sequelize, email);
    if (!(await passwordFits(found?.passwordHash ?? null, body.password)) || !found) {
      throw new Problem(401, 'wrong-sign-in', 'This e-mail address and password do not fit.');
    }
    await limits.succeeded(address, email);
    await startSession(req, { personId: found.personId, organisationId: found.organisationId });
    issueToken(config, req, res);
    return inTenant(sequelize, found.organisationId, async (tenant) => {
      const actor = await loadActor(tenant, found.personId);
      await recordEvent(tenant, {
        actorId: actor.personId,
        subjectKind: 'person',
        subjectId: actor.personId,
        action: 'signed-in',
      });
      return presentSession(tenant, actor);
    });
  });

  routes.on(readSession, async ({ tenant, actor }) => presentSession(tenant, actor));

  routes.open(signOut, async ({ req, res, config }) => {
    await endSession(req);
    res.clearCookie(config.secure ? '__Host-vatwright' : 'vatwright');
    res.clearCookie('XSRF-TOKEN');
  });

  accountRoutes(routes);
}
