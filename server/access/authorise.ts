import { type Ability, mayAt, mayEverywhere } from '@shared/access/ability';
import type { Place } from '@shared/access/role';
import { forbidden } from '@shared/problem';
import type { Actor } from './actor';

/** @throws Problem 403 unless the actor may do this at that place. */
export function authoriseAt(actor: Actor, ability: Ability, place: Place): void {
  if (!mayAt(ability, actor.grants, place)) throw forbidden();
}

/** @throws Problem 403 unless the actor may do this for the whole organisation. */
export function authoriseEverywhere(actor: Actor, ability: Ability): void {
  if (!mayEverywhere(ability, actor.grants)) throw forbidden();
}
