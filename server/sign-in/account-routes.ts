import { setTimeout as pause } from 'node:timers/promises';
import {
  acceptInvitation as acceptContract,
  changePassword as changePasswordContract,
  editOwnDetails as editOwnDetailsContract,
  endOwnSession as endOwnSessionContract,
  endOwnSessions,
  listOwnSessions,
  readInvitation as readInvitationContract,
  requestPasswordReset as requestContract,
  resetPassword as resetContract,
} from '@shared/sign-in/account-contract';
import { recordEvent } from '../audit/record-event';
import { issueToken } from '../http/cross-site-defence';
import type { Routes } from '../http/routes';
import { changePassword } from './change-password';
import { editOwnDetails } from './edit-own-details';
import { endSessionsOf } from './end-sessions';
import { acceptInvitation, readInvitation } from './invitation';
import { endOwnSession, ownSessions } from './own-sessions';
import { presentSession } from './present-session';
import { requestPasswordReset } from './request-password-reset';
import { resetPassword } from './reset-password';
import { startSession } from './session-life';
import { signInLimits } from './sign-in-limits';

/** Longer than queuing a letter takes, so that the time of the answer tells nothing either. */
const RESET_ANSWER_MS = 600;

/** What people do about their own account, signed in or by a letter's link. */
export function accountRoutes(routes: Routes): void {
  const limits = signInLimits(routes.services);
  const address = (req: { ip?: string | undefined }) => req.ip ?? 'unknown';

  routes.open(requestContract, async ({ body, sequelize, config, log, now, req }) => {
    await limits.letters.take(address(req));
    const email = body.email.toLowerCase();
    const answer = pause(RESET_ANSWER_MS);
    try {
      if (await limits.lettersTo.has(email)) {
        await requestPasswordReset(sequelize, email, config.BASE_URL, now());
      }
    } catch (error) {
      // A failure would tell that there was somebody to write to.
      log.error({ err: error, requestId: req.id }, 'password reset could not be queued');
    }
    await answer;
  });

  routes.open(resetContract, async ({ params, body, sequelize, now, req }) => {
    await limits.links.take(address(req));
    await resetPassword(sequelize, params.token, body.password, now());
  });

  routes.open(readInvitationContract, async ({ params, sequelize, now, req }) => {
    await limits.links.take(address(req));
    return readInvitation(sequelize, params.token, now());
  });

  routes.open(acceptContract, async ({ params, body, sequelize, now, req }) => {
    await limits.links.take(address(req));
    await acceptInvitation(sequelize, params.token, body, now());
  });

  routes.on(listOwnSessions, ({ tenant, actor, req }) =>
    ownSessions(tenant, actor.personId, req.sessionID),
  );

  routes.on(endOwnSessions, async ({ tenant, actor, query, req }) => {
    const { personId } = actor;
    await endSessionsOf(tenant, personId, query.keep === 'this' ? req.sessionID : null);
    await recordEvent(tenant, {
      actorId: personId,
      subjectKind: 'person',
      subjectId: personId,
      action: 'signed-out-everywhere',
    });
  });

  routes.on(endOwnSessionContract, async ({ tenant, actor, params }) => {
    await endOwnSession(tenant, actor.personId, params.id);
  });

  routes.on(editOwnDetailsContract, async ({ tenant, actor, body }) =>
    presentSession(tenant, await editOwnDetails(tenant, actor, body)),
  );

  routes.on(changePasswordContract, async ({ tenant, actor, body, config, req }) => {
    await limits.ownPassword.take(actor.personId);
    await changePassword(tenant, actor, body, req.sessionID);
    await startSession(req, {
      personId: actor.personId,
      organisationId: actor.organisationId,
    });
    // The page's token was bound to the session that has just been replaced.
    if (req.res) issueToken(config, req, req.res);
  });
}
