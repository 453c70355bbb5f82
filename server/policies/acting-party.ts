import type { Actor, Membership } from '../../shared/abilities/actor.ts';
import { NotFound } from '../errors.ts';

/**
 * The membership in whose name a person acts: the one named among those concerned, otherwise their first in the
 * commission. A person can be there twice, through two shops.
 */
export function actingParty(actor: Actor, commissionId: string, concerned: readonly string[] = []): Membership {
  const here = actor.memberships.filter(
    (membership) => membership.commissionId === commissionId && membership.shopRole !== 'bookkeeper',
  );
  const acting = here.find((membership) => concerned.includes(membership.partyId)) ?? here[0];
  if (!acting) throw new NotFound();
  return acting;
}

/** True when the person acts for this party. */
export const actsFor = (actor: Actor, partyId: string): boolean =>
  actor.memberships.some((membership) => membership.partyId === partyId && membership.shopRole !== 'bookkeeper');
