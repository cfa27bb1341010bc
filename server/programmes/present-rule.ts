import type { ReplyOf } from '@shared/contract/endpoint';
import type { readRule } from '@shared/programmes/programmes-contract';
import { recurrenceWords } from '@shared/programmes/recurrence-words';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { mayEditProgramme, scopesOf } from './programme-policy';
import { type RuleRecord, findRule, revisionsOf } from './rule-queries';

/** A rule as the contract tells it. */
export function presentRule(
  { stores, units, retiredAt, ...rule }: RuleRecord,
  mayEdit: boolean,
): ReplyOf<typeof readRule> {
  return {
    ...rule,
    words: recurrenceWords(rule.recurrence),
    retiredAt: retiredAt?.toISOString() ?? null,
    reach: { stores, units },
    mayEdit,
  };
}

/** Loads and presents one rule. @throws Problem 404 */
export async function presentRuleById(tenant: Tenant, actor: Actor, id: string) {
  const rule = await findRule(tenant, id);
  return presentRule(rule, mayEditProgramme(actor, await scopesOf(tenant, rule.programmeId)));
}

/** What a rule said in each revision. @throws Problem 404 */
export async function presentRevisions(tenant: Tenant, id: string) {
  await findRule(tenant, id);
  const revisions = await revisionsOf(tenant, id);
  return {
    rows: revisions.map(({ madeAt, ...it }) => ({
      ...it,
      words: recurrenceWords(it.definition.recurrence),
      madeAt: madeAt.toISOString(),
    })),
  };
}
