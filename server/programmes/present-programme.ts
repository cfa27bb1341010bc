import type { ReplyOf } from '@shared/contract/endpoint';
import type { readProgramme } from '@shared/programmes/programmes-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { enrolmentsOf } from './enrolment-queries';
import { presentRule } from './present-rule';
import { mayEditProgramme, mayEnrolAt, mayEnrolSomewhere } from './programme-policy';
import { findProgramme, reachOfProgrammes } from './programme-queries';
import { rulesOf } from './rule-queries';

/**
 * A programme with its rules and enrolments as the contract tells it.
 * @throws Problem 404
 */
export async function presentProgramme(
  tenant: Tenant,
  actor: Actor,
  id: string,
): Promise<ReplyOf<typeof readProgramme>> {
  const { retiredAt, ...found } = await findProgramme(tenant, id);
  const enrolments = await enrolmentsOf(tenant, id);
  const rules = await rulesOf(tenant, id);
  const reach = await tenant.row<{ stores: number; units: number }>(
    `SELECT stores, units FROM (${reachOfProgrammes}) reach WHERE programme_id = $1`,
    [id],
  );
  const mayEdit = mayEditProgramme(
    actor,
    enrolments.filter(({ exception }) => !exception),
  );
  return {
    ...found,
    retiredAt: retiredAt?.toISOString() ?? null,
    rules: rules.map((rule) => presentRule(rule, mayEdit)),
    enrolments: enrolments.map((it) => ({
      id: it.id,
      scopeKind: it.scopeKind,
      scopeId: it.scopeId,
      label: it.label,
      exception: it.exception,
      fromOn: it.fromOn,
      untilOn: it.untilOn,
      version: it.version,
      reach: { stores: it.stores, units: it.units },
      mayEdit: mayEnrolAt(actor, it),
    })),
    reach: reach ?? { stores: 0, units: 0 },
    mayEdit,
    mayEnrol: mayEnrolSomewhere(actor),
  };
}
